import { describe, expect, it } from 'vitest';

import { planStart } from '@/server/cli/startPlan';

const production = {
  NODE_ENV: 'production',
  DATABASE_URL: 'postgres://lampstep_server@db.example.org/lampstep',
  DATABASE_OWNER_URL: 'postgres://lampstep_owner@db.example.org/lampstep',
  PUBLIC_URL: 'https://bench.example.org',
  SESSION_SECRET: 'x'.repeat(32),
  SIGNING_KEY: '{}',
  SMTP_URL: 'smtp://mail.example.org',
  MAIL_FROM: 'lampstep@example.org',
  S3_BUCKET: 'lampstep',
};

describe('planStart', () => {
  it('makes up everything in development', () => {
    expect(planStart({})).toEqual({ database: 'private', demo: true, mailFake: true, storeFake: true, mayMovePort: true });
  });

  it('takes real services where they are given', () => {
    const given = { DATABASE_URL: production.DATABASE_URL, DATABASE_OWNER_URL: production.DATABASE_OWNER_URL, SMTP_URL: 'smtp://mail.example.org', S3_BUCKET: 'lampstep' };
    expect(planStart(given)).toEqual({ database: 'given', demo: true, mailFake: false, storeFake: false, mayMovePort: true });
  });

  it('has no demo, no fake, no private database and no other port in production', () => {
    expect(planStart(production)).toEqual({ database: 'given', demo: false, mailFake: false, storeFake: false, mayMovePort: false });
  });

  it.each(Object.keys(production).filter((name) => name !== 'NODE_ENV'))('refuses production without %s and names it', (name) => {
    for (const value of [undefined, '']) {
      expect(() => planStart({ ...production, [name]: value })).toThrow(new RegExp(`set ${name} \\(`));
    }
  });

  it('names all that is missing at once', () => {
    expect(() => planStart({ NODE_ENV: 'production' })).toThrow('DATABASE_URL, DATABASE_OWNER_URL, PUBLIC_URL, SESSION_SECRET, SIGNING_KEY, SMTP_URL, MAIL_FROM, S3_BUCKET');
  });

  it('wants the owner’s address beside a given database', () => {
    expect(() => planStart({ DATABASE_URL: production.DATABASE_URL })).toThrow('set DATABASE_OWNER_URL');
  });
});
