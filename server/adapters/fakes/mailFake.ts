/** A mail server for development and tests: takes every letter, delivers none, keeps each as a JSON file. */
import { mkdirSync, readdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';

import { SMTPServer } from 'smtp-server';

import { readLetter, type Letter } from './readLetter';

export type MailFake = {
  /** For SMTP_URL. */
  smtpUrl: string;
  /** Every letter kept in the folder, oldest first. */
  letters(): Letter[];
  stop(): Promise<void>;
};

/** Starts the fake on the loopback address (`port` 0: any free one); letters go to `dir` as `<time>-<n>.json`. */
export async function startMailFake({ dir, port = 0 }: { dir: string; port?: number }): Promise<MailFake> {
  mkdirSync(dir, { recursive: true });
  let count = 0;
  const server = new SMTPServer({
    authOptional: true,
    // It offers no certificate, so the adapter must not be told that it could have one.
    disabledCommands: ['STARTTLS'],
    onData(stream, session, done) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        count += 1;
        const receivedAt = new Date().toISOString();
        const to = session.envelope.rcptTo.map((recipient) => recipient.address);
        const letter: Letter = { receivedAt, to, ...readLetter(Buffer.concat(chunks).toString('latin1')) };
        const path = join(dir, `${receivedAt.replaceAll(/[:.]/g, '-')}-${String(count)}.json`);
        // Written beside and moved in, so that no reader finds half a letter.
        writeFileSync(`${path}.draft`, `${JSON.stringify(letter, null, 2)}\n`);
        renameSync(`${path}.draft`, path);
        done();
      });
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', resolve);
  });
  // A client that hangs up in the middle is the client's affair; it must not end the process.
  server.removeAllListeners('error');
  server.on('error', () => undefined);
  const address = server.server.address() as AddressInfo;
  return {
    smtpUrl: `smtp://127.0.0.1:${String(address.port)}`,
    letters: () => readLetters(dir),
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

/** The letters kept in a folder, oldest first. */
export function readLetters(dir: string): Letter[] {
  const inOrder = (name: string) => Number(/-(\d+)\.json$/.exec(name)?.[1] ?? 0);
  return readdirSync(dir)
    .filter((name) => name.endsWith('.json'))
    .sort((a, b) => a.slice(0, 24).localeCompare(b.slice(0, 24)) || inOrder(a) - inOrder(b))
    .map((name) => JSON.parse(readFileSync(join(dir, name), 'utf8')) as Letter);
}
