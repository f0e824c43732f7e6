import { describe, expect, it } from 'vitest';

import { makeSigningKey, PRODUCTION_BCRYPT_COST, readConfig } from '@/server/config';

const database = { DATABASE_URL: 'postgres://u@127.0.0.1:1/x' };
const production = {
  ...database,
  NODE_ENV: 'production',
  PUBLIC_URL: 'https://bench.example.org/',
  SESSION_SECRET: 'x'.repeat(32),
  SIGNING_KEY: JSON.stringify(makeSigningKey()),
  SMTP_URL: 'smtp://mail.example.org',
  MAIL_FROM: 'Lampstep <bench@example.org>',
  S3_BUCKET: 'lampstep',
};

describe('readConfig', () => {
  it('hashes passwords at cost 12 in production, whatever else is left out, and no lower', () => {
    expect(PRODUCTION_BCRYPT_COST).toBe(12);
    expect(readConfig(production).bcryptCost).toBe(12);
    expect(readConfig({ ...production, BCRYPT_COST: '13' }).bcryptCost).toBe(13);
    expect(() => readConfig({ ...production, BCRYPT_COST: '4' })).toThrow('The server cannot start: BCRYPT_COST is below 12.');
    expect(readConfig({ ...database, NODE_ENV: 'test', BCRYPT_COST: '4' }).bcryptCost).toBe(4);
    expect(readConfig(database).bcryptCost).toBe(12);
  });

  it('makes the secrets of development anew each time, and refuses to in production', () => {
    expect(readConfig(database).sessionSecret).not.toBe(readConfig(database).sessionSecret);
    for (const name of ['PUBLIC_URL', 'SESSION_SECRET', 'SIGNING_KEY', 'SMTP_URL', 'MAIL_FROM', 'S3_BUCKET']) {
      expect(() => readConfig({ ...production, [name]: '' }), name).toThrow(`The server cannot start: ${name} is missing.`);
    }
  });

  it('names every fault at once, and no value', () => {
    const faults = () => readConfig({ DATABASE_URL: 'mysql://secret', PORT: '99999', SESSION_SECRET: 'short', SIGNING_KEY: '{}', LOG_LEVEL: 'loud', BCRYPT_COST: 'x' });
    expect(faults).toThrow(/DATABASE_URL is not the address of a PostgreSQL database; PORT is above 65535; SESSION_SECRET is shorter than 32 characters; BCRYPT_COST is not a whole number; LOG_LEVEL .*; SIGNING_KEY is not a private Ed25519 key as a JWK\.$/);
    expect(faults).not.toThrow(/mysql|secret:|short'/);
    expect(() => readConfig({})).toThrow('The server cannot start: DATABASE_URL is missing.');
  });

  it('takes the address without the stroke at its end', () => {
    expect(readConfig(production).publicUrl).toBe('https://bench.example.org');
  });
});
