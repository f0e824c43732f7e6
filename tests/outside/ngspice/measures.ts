/** Runs one analysis in ngspice and reads its measures. */
import { runBatch } from './batch';

/**
 * Runs a deck in batch.
 * @param deck lines of the circuit with its own `.tran` or `.op`, without title and `.end`
 * @param measures lines for the control block, such as `meas tran low min v(out) from=0.4 to=0.5` or `print v(out)`
 * @returns every `name = number` that ngspice printed
 */
export function spiceMeasures(deck: readonly string[], measures: readonly string[]): ReadonlyMap<string, number> {
  return runBatch(
    () => ['a check from outside', ...deck, '.control', 'run', ...measures, 'quit 0', '.endc', '.end', ''].join('\n'),
    (printed) => {
      const found = [...printed.matchAll(/^\s*([\w.#()]+)\s*=\s*([-+]?\d[\d.]*(?:e[-+]?\d+)?)/gim)];
      return new Map(found.map(([, name = '', value = '']) => [name.toLowerCase(), Number(value)]));
    },
  );
}
