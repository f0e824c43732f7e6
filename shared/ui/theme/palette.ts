/** Colours of the two schemes, the safety colours that both share, and the contrast of two colours. */

/** The names by which every component asks for a colour. */
export interface Palette {
  /** ground of the page */
  paper: string;
  /** ground of a field, a plain answer, a panel */
  raised: string;
  /** ground of a chosen or hovered row */
  tint: string;
  ink: string;
  inkSoft: string;
  /** decoration only: never the sole border of a control */
  rule: string;
  action: string;
  actionPressed: string;
  onAction: string;
  brass: string;
  disabled: string;
  onDisabled: string;
  /** words about a hazard or a broken safety rule; nothing else */
  alarm: string;
  alarmTint: string;
  /** words about power that is proved away; nothing else */
  proved: string;
  scrim: string;
}

export type Scheme = 'light' | 'dark';

/** "Sheet": the printed service sheet by day. */
const sheet: Palette = {
  paper: '#F6F2E7',
  raised: '#FCF9F0',
  tint: '#ECE5D3',
  ink: '#1C2421',
  inkSoft: '#4D5651',
  rule: '#C9C1AC',
  action: '#1F6B60',
  actionPressed: '#17534A',
  onAction: '#FCF9F0',
  brass: '#8A5E12',
  disabled: '#C9C1AC',
  onDisabled: '#4A463B',
  alarm: '#9B2423',
  alarmTint: '#EFDFD6',
  proved: '#1C6B45',
  scrim: 'rgba(28, 36, 33, 0.62)',
};

/** "Night bench": the same sheet in a dim workshop. */
const nightBench: Palette = {
  paper: '#141816',
  raised: '#1C211E',
  tint: '#252C28',
  ink: '#ECE6D6',
  inkSoft: '#B3AE9F',
  rule: '#3A413C',
  action: '#6FC2B3',
  actionPressed: '#8FD3C6',
  onAction: '#141816',
  brass: '#E0B25C',
  disabled: '#3A413C',
  onDisabled: '#C3BEAF',
  alarm: '#F2988F',
  alarmTint: '#3A2320',
  proved: '#74C79D',
  scrim: 'rgba(0, 0, 0, 0.72)',
};

export const palettes: Readonly<Record<Scheme, Palette>> = { light: sheet, dark: nightBench };

/**
 * Safety colours, the same by day and by night. Red, yellow, green and blue are the RAL classic colours
 * named for ISO 3864 signs (3001, 1003, 6032, 5005); orange is the WARNING colour of ANSI Z535.1. The sRGB
 * values are from memory; the words and symbols beside them carry the meaning.
 */
export const safety = {
  red: '#9B2423',
  redLight: '#D9605A',
  yellow: '#F9A800',
  orange: '#FF7F11',
  green: '#237F52',
  blue: '#005387',
  blueLight: '#7FB4D6',
  grey: '#D5CEBD',
  greyDark: '#857E6C',
  black: '#0F1412',
  white: '#FFFFFF',
} as const;

function linear(channel: number): number {
  const c = channel / 255;
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
}

function luminance(hex: string): number {
  const n = Number.parseInt(hex.slice(1), 16);
  return 0.2126 * linear((n >> 16) & 255) + 0.7152 * linear((n >> 8) & 255) + 0.0722 * linear(n & 255);
}

/** Contrast ratio of two `#RRGGBB` colours, 1 to 21 (WCAG 2.2, "contrast ratio" and "relative luminance"). */
export function contrast(one: string, other: string): number {
  const [a, b] = [luminance(one), luminance(other)];
  return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
}
