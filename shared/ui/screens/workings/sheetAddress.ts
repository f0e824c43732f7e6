/** Inputs of a sheet in its address, so that it can be kept and sent. */
import type { SheetPart, SheetTexts } from '@/shared/ui/screens/workings/sheetPart';
import { cellName, rowCount } from '@/shared/ui/screens/workings/sheetRows';

/** Parameters as a router gives them. */
export type Given = Readonly<Record<string, string | string[] | undefined>>;

/** Which fields stand as a machine's profile said, and which machine that was. */
export interface Taken {
  machine: string;
  names: ReadonlySet<string>;
}

// no input has a hyphen in its name
const MACHINE = 'from-machine';
const FIELDS = 'from-fields';

/** What the address says over what stands there at first. A list in the address replaces the whole list; what cannot be read is kept as it is. */
export function textsFrom(parts: readonly SheetPart[], start: SheetTexts, given: Given): Record<string, string> {
  const texts: Record<string, string> = {};
  for (const part of parts) {
    const own = one(given[part.name]);
    if (part.kind !== 'rows') {
      texts[part.name] = own ?? start[part.name] ?? '';
      continue;
    }
    const from = own === undefined ? start : given;
    const count = rowCount(part, { [part.name]: own ?? start[part.name] ?? '0' });
    texts[part.name] = String(count);
    for (let row = 0; row < count; row += 1)
      for (const column of part.columns) {
        const key = cellName(part, row, column);
        texts[key] = one(from[key]) ?? '';
      }
  }
  return texts;
}

/** What the address says of where its inputs come from; null where they were typed. */
export function takenFrom(given: Given): Taken | null {
  const machine = one(given[MACHINE]);
  return machine === undefined || machine === ''
    ? null
    : { machine, names: new Set((one(given[FIELDS]) ?? '').split(' ').filter(Boolean)) };
}

function one(value: string | string[] | undefined): string | undefined {
  return typeof value === 'string' ? value : value?.[0];
}

/**
 * Parameters for the router: every input, empty cells of lists left out. Names in `before` that are no longer there come as undefined, so that
 * the router drops them.
 */
export function parametersOf(texts: SheetTexts, taken: Taken | null, before: Given = {}): Record<string, string | undefined> {
  const kept = Object.entries(texts).filter(([key, text]) => text !== '' || !key.includes('.'));
  const gone = Object.keys(before).map((key): [string, undefined] => [key, undefined]);
  const from = taken === null || taken.names.size === 0 ? {} : { [MACHINE]: taken.machine, [FIELDS]: [...taken.names].join(' ') };
  return { ...Object.fromEntries(gone), ...Object.fromEntries(kept), ...from };
}

/** The address of a sheet with its inputs, from the root of the site. */
export function sheetAddress(sheetId: string, texts: SheetTexts, taken: Taken | null): string {
  const given = Object.entries(parametersOf(texts, taken)).flatMap(([key, text]): [string, string][] =>
    text === undefined ? [] : [[key, text]],
  );
  return `/workings/${sheetId}?${new URLSearchParams(given).toString()}`;
}
