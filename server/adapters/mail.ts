/** Sending mail over SMTP. */
import { createTransport } from 'nodemailer';
import type { Logger } from 'pino';

import type { Config } from '../config';

export interface Letter {
  to: { name: string; address: string };
  subject: string;
  text: string;
  html: string;
}

export interface Mailer {
  /** Resolves when the mail server has taken it; throws when it has not, so that the job is tried again. */
  send(letter: Letter): Promise<void>;
  close(): void;
}

/** A mailer for the SMTP server of the configuration. Without one it refuses every letter, so that letters wait in the queue. */
export function createMailer(config: Pick<Config, 'smtpUrl' | 'mailFrom'>, log: Logger): Mailer {
  const { smtpUrl, mailFrom } = config;
  if (smtpUrl === null) {
    log.warn('SMTP_URL is not set: letters wait in the queue until it is');
    return { send: () => Promise.reject(new Error('SMTP_URL is not set')), close: () => undefined };
  }
  const transport = createTransport({ url: smtpUrl, connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 30_000 }, { from: mailFrom });
  return {
    send: async (letter) => {
      await transport.sendMail({ ...letter, disableFileAccess: true, disableUrlAccess: true });
    },
    close: () => transport.close(),
  };
}
