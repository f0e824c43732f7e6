/** The three faces and the sizes at which they are set. Nothing is smaller than 16 px. */

/** Family names as registered by `fonts.ts`. Bold is a family of its own: a weight would be smeared by the browser. */
export const face = {
  text: 'Lampstep Text, system-ui, sans-serif',
  textBold: 'Lampstep Text Bold, system-ui, sans-serif',
  head: 'Lampstep Head, Arial Narrow, system-ui, sans-serif',
  mono: 'Lampstep Mono, ui-monospace, monospace',
  monoBold: 'Lampstep Mono Bold, ui-monospace, monospace',
} as const;

interface TypeStyle {
  fontFamily: string;
  fontSize: number;
  lineHeight: number;
  letterSpacing?: number;
}

export const type = {
  display: { fontFamily: face.head, fontSize: 40, lineHeight: 44 },
  title: { fontFamily: face.head, fontSize: 34, lineHeight: 38 },
  section: { fontFamily: face.head, fontSize: 26, lineHeight: 30 },
  sub: { fontFamily: face.head, fontSize: 22, lineHeight: 26 },
  label: { fontFamily: face.head, fontSize: 16, lineHeight: 20, letterSpacing: 0.9 },
  button: { fontFamily: face.head, fontSize: 22, lineHeight: 26, letterSpacing: 0.2 },
  answer: { fontFamily: face.head, fontSize: 24, lineHeight: 28, letterSpacing: 0.2 },
  signal: { fontFamily: face.head, fontSize: 30, lineHeight: 34, letterSpacing: 1.2 },
  instruction: { fontFamily: face.text, fontSize: 20, lineHeight: 28 },
  body: { fontFamily: face.text, fontSize: 18, lineHeight: 26 },
  small: { fontFamily: face.text, fontSize: 16, lineHeight: 22 },
  mono: { fontFamily: face.mono, fontSize: 18, lineHeight: 26 },
  reading: { fontFamily: face.mono, fontSize: 56, lineHeight: 64 },
} as const satisfies Record<string, TypeStyle>;

/** Smallest size used anywhere, in CSS pixels; drawings set their words at this size too. */
export const smallestTextPx = 16;
