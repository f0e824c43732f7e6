/** The letter "countersign wanted". */
import type { Letter } from '../adapters/mail';
import { escapeHtml } from './escapeHtml';

export interface CountersignWanted {
  to: { name: string; address: string };
  machine: string;
  serial: string;
  tree: string;
  step: string;
  restorer: string;
  /** address of the hold on the server */
  link: string;
}

/** Writes it as text and as HTML. */
export function countersignWanted(wish: CountersignWanted): Letter {
  const lines = [
    `${wish.restorer} waits at a hold point and cannot go on without a senior.`,
    `Machine: ${wish.machine}, serial ${wish.serial}`,
    `Tree: ${wish.tree}`,
    `Step: ${wish.step}`,
  ];
  const caution = 'Read the facts and the last readings before you sign. Local electrical codes, the maker’s data and licensed practice come first.';
  const subject = `Countersign wanted: ${wish.machine}, ${wish.step}`.replace(/\s+/g, ' ');
  return {
    to: wish.to,
    subject,
    text: [`Dear ${wish.to.name},`, '', ...lines, '', caution, '', wish.link, ''].join('\n'),
    html: `<!doctype html><html lang="en"><meta charset="utf-8"><title>${escapeHtml(subject)}</title><body><p>Dear ${escapeHtml(wish.to.name)},</p><p>${lines
      .map(escapeHtml)
      .join('<br>')}</p><p>${escapeHtml(caution)}</p><p><a href="${escapeHtml(wish.link)}">Open the hold point</a></p></body></html>`,
  };
}
