/** Reading the environment once, at the start; nothing else in the server looks at it. */
import { generateKeyPairSync, randomBytes } from 'node:crypto';

import { z } from 'zod';

const signingKeySchema = z.looseObject({ kty: z.literal('OKP'), crv: z.literal('Ed25519'), x: z.string().min(1), d: z.string().min(1) });
export type SigningKey = z.infer<typeof signingKeySchema>;

const url = (scheme: RegExp, what: string) => z.string().regex(scheme, `is not the address of ${what}`);
const wholeNumber = (least: number, most: number) =>
  z.string().regex(/^\d+$/, 'is not a whole number').transform(Number).pipe(z.number().min(least, `is below ${least}`).max(most, `is above ${most}`));

const envSchema = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  DATABASE_URL: url(/^postgres(ql)?:\/\//, 'a PostgreSQL database'),
  DATABASE_OWNER_URL: url(/^postgres(ql)?:\/\//, 'a PostgreSQL database').optional(),
  DATABASE_KEEPER_URL: url(/^postgres(ql)?:\/\//, 'a PostgreSQL database').optional(),
  HOST: z.string().min(1).default('127.0.0.1'),
  PORT: wholeNumber(0, 65_535).default(8080),
  PUBLIC_URL: url(/^https?:\/\//, 'a web server').optional(),
  SESSION_SECRET: z.string().min(32, 'is shorter than 32 characters').optional(),
  SIGNING_KEY: z.string().optional(),
  SMTP_URL: url(/^smtps?:\/\//, 'a mail server').optional(),
  MAIL_FROM: z.string().min(3).optional(),
  S3_BUCKET: z.string().regex(/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/, 'is not the name of a bucket').optional(),
  S3_ENDPOINT: url(/^https?:\/\//, 'an object store').optional(),
  S3_REGION: z.string().min(1).default('us-east-1'),
  S3_ACCESS_KEY: z.string().min(1).optional(),
  S3_SECRET_KEY: z.string().min(1).optional(),
  BCRYPT_COST: wholeNumber(4, 15).optional(),
  SIGN_IN_TRIES: wholeNumber(1, 1_000_000).default(30),
  TRUST_PROXY: wholeNumber(0, 10).default(0),
  WEB_ROOT: z.string().min(1).optional(),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
});

/** A bucket of a store that speaks the S3 protocol. */
export interface ObjectStoreConfig {
  bucket: string;
  /** null: the address that the SDK makes of the region */
  endpoint: string | null;
  region: string;
  /** null: the SDK looks where it always looks, such as the role of the machine */
  accessKey: string | null;
  secretKey: string | null;
}

export interface Config {
  production: boolean;
  /** answers are parsed with the contract before they leave */
  checkAnswers: boolean;
  databaseUrl: string;
  databaseOwnerUrl: string | null;
  databaseKeeperUrl: string | null;
  host: string;
  port: number;
  /** null: the address that the server listens on */
  publicUrl: string | null;
  sessionSecret: string;
  signingKey: SigningKey;
  smtpUrl: string | null;
  mailFrom: string;
  /** where photos and papers lie; null: nowhere, and every upload is refused */
  objectStore: ObjectStoreConfig | null;
  bcryptCost: number;
  /** tries to give a password in 15 minutes, for one address or person */
  signInTries: number;
  /** proxies in front of the server whose forwarded address is believed */
  trustProxy: number;
  webRoot: string | null;
  logLevel: 'fatal' | 'error' | 'warn' | 'info' | 'debug' | 'trace' | 'silent';
}

/** What a password hash costs in production; a lower number would make a stolen table cheap to break. */
export const PRODUCTION_BCRYPT_COST = 12;

const WANTED_IN_PRODUCTION = ['PUBLIC_URL', 'SESSION_SECRET', 'SIGNING_KEY', 'SMTP_URL', 'MAIL_FROM', 'S3_BUCKET'] as const;

/**
 * Reads and checks the environment. Throws one error that names every variable at fault, never a value. Outside production the secrets
 * that are missing are made for this process alone: sessions and signatures then end with it.
 */
export function readConfig(env: Readonly<Record<string, string | undefined>>): Config {
  // An empty variable counts as missing: that is how `.env` files and containers unset one.
  const given = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== undefined && value !== ''));
  const parsed = envSchema.safeParse(given);
  const faults = parsed.success ? [] : parsed.error.issues.map((issue) => `${issue.path.join('.')} ${given[String(issue.path[0])] === undefined ? 'is missing' : issue.message}`);
  const production = given['NODE_ENV'] === 'production';
  if (production) {
    for (const name of WANTED_IN_PRODUCTION) if (given[name] === undefined) faults.push(`${name} is missing`);
    if (given['BCRYPT_COST'] !== undefined && Number(given['BCRYPT_COST']) < PRODUCTION_BCRYPT_COST) faults.push(`BCRYPT_COST is below ${PRODUCTION_BCRYPT_COST}`);
  }
  const signingKey = given['SIGNING_KEY'] === undefined ? undefined : readSigningKey(given['SIGNING_KEY']);
  if (signingKey === null) faults.push('SIGNING_KEY is not a private Ed25519 key as a JWK');
  if (!parsed.success || faults.length > 0) throw new Error(`The server cannot start: ${faults.join('; ')}.`);
  const e = parsed.data;
  return {
    production,
    checkAnswers: !production,
    databaseUrl: e.DATABASE_URL,
    databaseOwnerUrl: e.DATABASE_OWNER_URL ?? null,
    databaseKeeperUrl: e.DATABASE_KEEPER_URL ?? null,
    host: e.HOST,
    port: e.PORT,
    publicUrl: e.PUBLIC_URL?.replace(/\/+$/, '') ?? null,
    sessionSecret: e.SESSION_SECRET ?? randomBytes(32).toString('base64url'),
    signingKey: signingKey ?? makeSigningKey(),
    smtpUrl: e.SMTP_URL ?? null,
    mailFrom: e.MAIL_FROM ?? 'Lampstep <lampstep@example.org>',
    objectStore:
      e.S3_BUCKET === undefined
        ? null
        : { bucket: e.S3_BUCKET, endpoint: e.S3_ENDPOINT ?? null, region: e.S3_REGION, accessKey: e.S3_ACCESS_KEY ?? null, secretKey: e.S3_SECRET_KEY ?? null },
    bcryptCost: e.BCRYPT_COST ?? PRODUCTION_BCRYPT_COST,
    signInTries: e.SIGN_IN_TRIES,
    trustProxy: e.TRUST_PROXY,
    webRoot: e.WEB_ROOT ?? null,
    logLevel: e.LOG_LEVEL,
  };
}

/** A new private Ed25519 key as a JWK. */
export function makeSigningKey(): SigningKey {
  return signingKeySchema.parse(generateKeyPairSync('ed25519').privateKey.export({ format: 'jwk' }));
}

function readSigningKey(text: string): SigningKey | null {
  try {
    const parsed = signingKeySchema.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}
