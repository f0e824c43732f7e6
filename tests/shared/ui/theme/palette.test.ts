import { describe, expect, it } from 'vitest';

import { powerVisual } from '@/shared/ui/components/powerVisual';
import type { PowerState } from '@/shared/ui/components/powerVisual';
import { pressVisual } from '@/shared/ui/components/pressVisual';
import { signalVisual } from '@/shared/ui/components/warningVisual';
import { contrast, palettes, safety } from '@/shared/ui/theme/palette';
import type { Palette } from '@/shared/ui/theme/palette';

const schemes = Object.entries(palettes);
const powers: PowerState[] = ['proved-dead', 'off', 'lamp', 'bench', 'mains', 'unknown'];

// Limits: WCAG 2.2, success criteria 1.4.3 (text, 4.5:1) and 1.4.11 (controls, 3:1).
const text = 4.5;
const control = 3;

describe('contrast', () => {
  it('agrees with the ends of the scale and with the worked value #777777 on white that WCAG writers use (4.48:1, common practice, no source)', () => {
    expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 5);
    expect(contrast('#1F6B60', '#1F6B60')).toBe(1);
    expect(contrast('#777777', '#FFFFFF')).toBeCloseTo(4.48, 2);
  });
});

describe.each(schemes)('palette %s', (_name, c) => {
  const words: (keyof Palette)[] = ['ink', 'inkSoft', 'action', 'brass', 'alarm', 'proved'];
  const grounds: (keyof Palette)[] = ['paper', 'raised', 'tint'];
  const pairs = words.flatMap((word) => grounds.map((ground) => [word, ground] as const));

  it.each(pairs)('%s on %s can be read', (word, ground) => {
    expect(contrast(c[word], c[ground])).toBeGreaterThanOrEqual(text);
  });

  it.each([
    ['onAction', 'action'],
    ['onAction', 'actionPressed'],
    ['onDisabled', 'disabled'],
    ['paper', 'ink'],
    ['alarm', 'alarmTint'],
  ] as const)('%s on %s can be read', (word, ground) => {
    expect(contrast(c[word], c[ground])).toBeGreaterThanOrEqual(text);
  });

  it.each(['primary', 'plain'] as const)('the edge of a %s button stands out from the paper in each state', (kind) => {
    for (const pressed of [false, true]) {
      for (const hovered of [false, true]) {
        const v = pressVisual(kind, { disabled: false, pressed, hovered }, c);
        expect(contrast(v.border, c.paper)).toBeGreaterThanOrEqual(control);
        expect(contrast(v.word, v.ground)).toBeGreaterThanOrEqual(text);
      }
    }
  });

  it('marks, needles and the focus ring stand out', () => {
    for (const mark of [c.ink, c.brass, c.action]) expect(contrast(mark, c.paper)).toBeGreaterThanOrEqual(control);
  });
});

describe('safety colours', () => {
  it.each(powers)('the word of %s can be read on its band', (state) => {
    const v = powerVisual(state);
    expect(contrast(v.ink, v.ground)).toBeGreaterThanOrEqual(text);
  });

  it.each(['danger', 'warning', 'caution', 'notice'] as const)('the signal word %s can be read on its panel', (signal) => {
    const v = signalVisual(signal);
    expect(contrast(v.ink, v.ground)).toBeGreaterThanOrEqual(text);
  });

  it('the stop bar can be read, at rest and pressed', () => {
    expect(contrast(safety.white, safety.red)).toBeGreaterThanOrEqual(text);
    expect(contrast(safety.white, safety.black)).toBeGreaterThanOrEqual(text);
  });
});
