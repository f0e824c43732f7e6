/** The letter "your password was changed". */
import type { Letter } from '../adapters/mail';
import { escapeHtml } from './escapeHtml';

export const PASSWORD_CHANGED = 'password-changed';

/** Writes it as text and as HTML. */
export function passwordChanged(wish: { to: { name: string; address: string }; workshop: string; at: Date }): Letter {
  const when = `${wish.at.toISOString().slice(0, 16).replace('T', ' ')} UTC`;
  const lines = [
    `Your password for Lampstep (${wish.workshop}) was changed on ${when}. Every other session of yours has ended.`,
    'If this was not you, tell the keeper of your workshop at once.',
  ];
  const subject = 'Your password was changed';
  return {
    to: wish.to,
    subject,
    text: [`Dear ${wish.to.name},`, '', ...lines, ''].join('\n'),
    html: `<!doctype html><html lang="en"><meta charset="utf-8"><title>${subject}</title><body><p>Dear ${escapeHtml(wish.to.name)},</p>${lines.map((line) => `<p>${escapeHtml(line)}</p>`).join('')}</body></html>`,
  };
}
