import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { createTransport } from 'nodemailer';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { startMailFake, type MailFake } from '@/server/adapters/fakes/mailFake';
import { readLetter } from '@/server/adapters/fakes/readLetter';

describe('startMailFake', () => {
  const dir = mkdtempSync(join(tmpdir(), 'lampstep-letters-'));
  let fake: MailFake;

  beforeAll(async () => {
    fake = await startMailFake({ dir });
  });

  afterAll(async () => {
    await fake.stop();
    rmSync(dir, { recursive: true });
  });

  it('keeps what a person would read, in the order in which it came', async () => {
    const transport = createTransport(fake.smtpUrl);
    const from = '"Lämpstep" <lampstep@example.org>';
    const long = `Step 7 wants a countersign: +5 V rail, 4.97 V ± 5 %, 470 mΩ. ${'Wort für Wort '.repeat(20)}`.trim();
    await transport.sendMail({ from, to: 'senior@example.org, senior2@example.org', subject: 'Countersign wanted – Corvane 12, größer als üblich', text: long, html: `<p>${long}</p>` });
    await transport.sendMail({ from, to: 'keeper@example.org', subject: 'Second', text: 'Plain ASCII.' });

    expect(fake.letters()).toMatchObject([
      {
        from: expect.stringContaining('Lämpstep') as string,
        to: ['senior@example.org', 'senior2@example.org'],
        subject: 'Countersign wanted – Corvane 12, größer als üblich',
        text: long,
        html: `<p>${long}</p>`,
      },
      { to: ['keeper@example.org'], subject: 'Second', text: 'Plain ASCII.', html: '' },
    ]);
  });
});

describe('readLetter', () => {
  // RFC 2047 section 8: the pairs of encoded words and what is displayed. Its examples use ISO-8859-1; the form is the same.
  it.each([
    ['=?UTF-8?Q?a?=', 'a'],
    ['=?UTF-8?Q?a?= b', 'a b'],
    ['=?UTF-8?Q?a?= =?UTF-8?Q?b?=', 'ab'],
    ['=?UTF-8?Q?a_b?=', 'a b'],
    ['=?UTF-8?Q?a?= =?UTF-8?Q?_b?=', 'a b'],
  ])('shows the subject %s as “%s”', (written, shown) => {
    expect(readLetter(`Subject: ${written}\r\n\r\n`).subject).toBe(shown);
  });
});
