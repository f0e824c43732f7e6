/** Published values of fuses. */
import type { OutsideValue, SheetValue } from '@/tests/outside/outsideValue';

const guide = 'Littelfuse fuse guide, “UL/CSA 248-14” (the page prints “0.1 to 15” for 10.1 to 15)';
const sheet3 = 'Littelfuse data sheet 218 (IEC 60127-2 sheet 3, time-lag) and Schurter data sheet FST 5×20: the same table in both';
const sheet2 = 'Littelfuse data sheet 617 (IEC 60127-2 sheet 2, fast-acting)';
const shapes = 'Littelfuse fuse guide, chart 1, formulas of wave shapes; 10 A for 4 ms worked out';
const load = { ratedAmps: 1, loadAmps: 0.5 };

const row = (
  what: string,
  source: string,
  given: Record<string, unknown>,
  read: string,
  expected: number | string,
  within = 1e-9,
): SheetValue => ({
  sheet: 'fuse-inrush',
  what,
  source,
  given: { ...load, ...given },
  read,
  expected,
  within,
});
const breaks = (ratedAmps: number, amps: number): SheetValue =>
  row(`UL ${String(ratedAmps)} A, breaking rating at 250 V`, guide, { standard: 'ul-248-14', ratedAmps }, 'breakingAmps', amps);
const pulse = (shape: string, expected: number): SheetValue =>
  row(`${shape} of 10 A, 4 ms`, shapes, { shape, peakAmps: 10, pulseSeconds: 0.004 }, 'pulse.ampSquaredSeconds', expected, expected / 1000);
const gate = (speed: string, at: number, times: number, side: 'leastSeconds' | 'mostSeconds', seconds: number): SheetValue =>
  row(`${speed}, ${String(times)} × rated, ${side}`, speed === 'slow' ? sheet3 : sheet2, { speed }, `gates.${String(at)}.${side}`, seconds);
const starts = (pulses: number, percent: number): SheetValue =>
  row(
    `${String(pulses)} starts at ${String(percent)} % of melting`,
    'Littelfuse fuse guide, chart 2, pulse cycle withstand capability',
    { shape: 'square', peakAmps: 10, pulseSeconds: 0.01, melting: 100 / percent, starts: pulses },
    'pulse.starts',
    pulses,
  );

export const values: readonly OutsideValue[] = [
  row('UL 1 A must blow from', guide, { standard: 'ul-248-14' }, 'blowsFromAmps', 1.35),
  row('UL, at 135 % within', guide, { standard: 'ul-248-14' }, 'gates.0.mostSeconds', 3600),
  row('UL, at 200 % within', guide, { standard: 'ul-248-14' }, 'gates.1.mostSeconds', 120),
  row(
    'UL, operating current',
    'L. Lundy (Littelfuse), EDN, 26 September 1996: 75 % of the nominal rating',
    { standard: 'ul-248-14' },
    'carryAmps',
    0.75,
  ),
  row('UL fuse for 0.75 A', 'Same; 0.75 A ÷ 75 % worked out', { standard: 'ul-248-14', loadAmps: 0.75 }, 'leastRating', 1),
  row(
    'IEC, continuous current',
    'Comparison of European and American fuse standards (ibex.tech): may run at 100 % of rating',
    {},
    'carryAmps',
    1,
  ),
  row('IEC 1 A must blow from', 'IEC 60127, 210 %, as quoted in a product safety mailing list (emc-pstc)', {}, 'blowsFromAmps', 2.1),
  row(
    'IEC T3A15 glass, breaking capacity',
    'Littelfuse data sheet 617: 35 A at 250 V a.c. up to 3.15 A, 40 A for 4 A',
    { ratedAmps: 3.15 },
    'breakingAmps',
    35,
  ),
  row(
    'IEC 10 A glass, breaking capacity',
    'Littelfuse data sheet 617: 100 A at 250 V a.c. for 10 A',
    { ratedAmps: 10 },
    'breakingAmps',
    100,
  ),
  row(
    'IEC 6.3 A glass, breaking capacity',
    'Littelfuse data sheet 617: 63 A at 250 V a.c. for 6.3 A',
    { ratedAmps: 6.3 },
    'breakingAmps',
    63,
  ),
  breaks(1, 35),
  breaks(2, 100),
  breaks(8, 200),
  breaks(12, 750),
  breaks(20, 1500),
  row(
    'UL 1 A, breaking rating at 125 V',
    `${guide}: 10,000 A a.c. at 125 V`,
    { standard: 'ul-248-14', volts: 125 },
    'breakingAmps',
    10_000,
  ),
  gate('slow', 0, 1.5, 'leastSeconds', 3600),
  gate('slow', 1, 2.1, 'mostSeconds', 120),
  gate('slow', 2, 2.75, 'leastSeconds', 0.6),
  gate('slow', 2, 2.75, 'mostSeconds', 10),
  gate('slow', 3, 4, 'mostSeconds', 3),
  gate('slow', 4, 10, 'leastSeconds', 0.02),
  gate('fast', 1, 2.1, 'mostSeconds', 1800),
  gate('fast', 2, 2.75, 'mostSeconds', 2),
  gate('fast', 3, 4, 'leastSeconds', 0.01),
  gate('fast', 4, 10, 'mostSeconds', 0.02),
  pulse('square', 0.4),
  pulse('half-sine', 0.2),
  pulse('triangle', 0.13333),
  pulse('parabola', 0.08),
  pulse('exponential', 0.2),
  starts(100_000, 22),
  starts(10_000, 29),
  starts(1000, 38),
  starts(100, 48),
  row(
    'half-sine of 10 A, 4 ms, 10 000 times, least melting value',
    'Littelfuse fuse guide, charts 1 and 2; 0.200 A²s ÷ 29 % worked out',
    { shape: 'half-sine', peakAmps: 10, pulseSeconds: 0.004, starts: 10_000 },
    'pulse.leastMelting',
    0.69,
    0.0005,
  ),
];
