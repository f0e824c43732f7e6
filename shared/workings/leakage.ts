/** Leakage that an aluminium electrolytic is allowed, by named rule. They differ a hundredfold, so none goes unnamed. */

/** The rules that the sheet knows. */
export const LEAKAGE_RULES = ['two-minutes', 'five-minutes', 'period'] as const;
/** One of them. */
export type LeakageRule = (typeof LEAKAGE_RULES)[number];

/** What each is called and who says so. */
export const LEAKAGE_NAMES: Readonly<Record<LeakageRule, string>> = {
  'two-minutes': '0.01 × C × V or 3 μA, the greater, after 2 minutes (makers’ data sheets, such as Vishay 038 RSU)',
  'five-minutes': '0.002 × C × V + 3 μA after 5 minutes (makers’ data sheets, such as Vishay 038 RSU)',
  period: 'k × C + 0.3 mA (JAN-C-62, the acceptance limit of its day; not a limit at which to stop)',
};

/** Most volts that the period rule speaks of. */
export const PERIOD_MOST_VOLTS = 500;

/**
 * Allowed leakage.
 * @param farads as marked
 * @param volts rated
 * @returns amps; null where the rule says nothing
 */
export function leakageLimit(rule: LeakageRule, farads: number, volts: number): number | null {
  const microfarads = farads * 1e6;
  switch (rule) {
    case 'two-minutes':
      return Math.max(0.01 * microfarads * volts, 3) * 1e-6;
    case 'five-minutes':
      return (0.002 * microfarads * volts + 3) * 1e-6;
    case 'period': {
      if (volts > PERIOD_MOST_VOLTS) return null;
      const k = volts <= 100 ? 0.01 : volts <= 250 ? 0.02 : volts <= 350 ? 0.025 : 0.04;
      return (k * microfarads + 0.3) * 1e-3;
    }
  }
}
