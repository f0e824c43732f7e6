/** What `npm start` sets up, decided from the environment alone. */

export type Env = Readonly<Record<string, string | undefined>>;

export type StartPlan = {
  /** 'private': a cluster of its own in the checkout; 'given': the one at DATABASE_URL. */
  database: 'private' | 'given';
  /** Whether the demo workshops and their accounts are loaded. */
  demo: boolean;
  /** Whether letters go to the local fake. */
  mailFake: boolean;
  /** Whether photos and papers go to the local fake. */
  storeFake: boolean;
  /** Whether another port is taken when the wanted one is not free. */
  mayMovePort: boolean;
};

/**
 * Throws one sentence that names every missing variable. In production nothing is made up: no private cluster, no demo
 * account, no fake, no other port.
 */
export function planStart(env: Env): StartPlan {
  const given = (name: string) => (env[name] ?? '') !== '';
  const production = env['NODE_ENV'] === 'production';
  const missing: string[] = [];
  if (production && !given('DATABASE_URL')) missing.push('DATABASE_URL');
  if ((production || given('DATABASE_URL')) && !given('DATABASE_OWNER_URL')) missing.push('DATABASE_OWNER_URL');
  if (production) missing.push(...['PUBLIC_URL', 'SESSION_SECRET', 'SIGNING_KEY', 'SMTP_URL', 'MAIL_FROM', 'S3_BUCKET'].filter((name) => !given(name)));
  if (missing.length > 0) {
    const why = production ? 'With NODE_ENV=production nothing is made up' : 'A database is given by DATABASE_URL';
    throw new Error(`${why}: set ${missing.join(', ')} (see .env.example).`);
  }
  return {
    database: given('DATABASE_URL') ? 'given' : 'private',
    demo: !production,
    mailFake: !production && !given('SMTP_URL'),
    storeFake: !production && !given('S3_BUCKET'),
    mayMovePort: !production,
  };
}
