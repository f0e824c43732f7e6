/** Workings that were put into a record, worked out again here. */
import type { MachineEvent } from '@/flows/machine/events';
import { sheetById } from '@/shared/workings/list';
import { inputWords } from '@/shared/workings/inputWords';
import { runSheet } from '@/shared/workings/sheet';

/** What was noted, from which inputs, and whether the sheet still says the same: the device's word alone is not taken for it. */
export function noteWords({ sheet: id, inputs, headline }: Extract<MachineEvent, { type: 'NOTE' }>): { what: string; detail: string } {
  const sheet = sheetById(id);
  const what = `Workings, ${sheet?.title ?? id}: ${headline}`;
  if (sheet === undefined) return { what, detail: 'This version of the application has no such sheet, so it cannot be worked out again.' };
  const again = runSheet(sheet, inputs);
  const from = `from ${inputWords(sheet.inputs, inputs)}`;
  if (!again.ok) return { what, detail: `${from}. Worked out again, the sheet does not take these inputs: ${again.say}` };
  if (again.headline !== headline) return { what, detail: `${from}. Worked out again, the sheet says: ${again.headline}` };
  return { what, detail: `${from}. Worked out again: the same.` };
}
