/** The users' page of all sheets, made from the sheets themselves so that it cannot drift. */
import type { AnySheet } from '@/shared/workings/list';
import { SHEETS } from '@/shared/workings/list';
import type { FieldInfo } from '@/shared/workings/sheet';
import { fieldsOf, runSheet } from '@/shared/workings/sheet';

const cell = (text: string): string => text.replaceAll('|', '\\|');

function whenNotGiven({ fallback }: FieldInfo): string {
  if (fallback === undefined) return 'must be given';
  if (Array.isArray(fallback)) return fallback.length === 0 ? 'none' : JSON.stringify(fallback);
  return fallback === null ? 'none' : String(fallback);
}

function inputLines(inputs: readonly (readonly [string, FieldInfo])[], before = ''): readonly string[] {
  return inputs.flatMap(([name, field]) => {
    const what =
      field.choices === null ? field.description : `${field.description}: ${field.choices.map((choice) => `\`${choice}\``).join(', ')}`;
    const line = `| ${field.title} (\`${before}${name}\`) | ${cell(what)} | ${field.unit ?? ''} | ${whenNotGiven(field)} |`;
    return [line, ...(field.rows === null ? [] : inputLines(field.rows.columns, `${name}[].`))];
  });
}

function section(sheet: AnySheet): readonly string[] {
  const answer = runSheet(sheet, sheet.example);
  if (!answer.ok) throw new Error(`The example of ${sheet.id} is refused at ${answer.field}: ${answer.say}`);
  const lines = [
    `## ${sheet.title} (\`${sheet.id}\`)`,
    '',
    sheet.question,
    '',
    '| input | what it is | unit | when not given |',
    '| --- | --- | --- | --- |',
  ];
  lines.push(...inputLines(fieldsOf(sheet.inputs)));
  lines.push('', '**Formula**', '', ...sheet.law.map((line) => `- ${line}`));
  lines.push(
    '',
    '**Example**',
    '',
    '```json',
    JSON.stringify(sheet.example),
    '```',
    '',
    `> ${answer.headline}`,
    '',
    ...answer.formula.map((line) => `- ${line}`),
  );
  lines.push('', `**Valid.** ${sheet.validity}`, '', `**Source.** ${sheet.source}`);
  if (sheet.caution !== '') lines.push('', `**Caution.** ${sheet.caution}`);
  lines.push('', '**Checked against**', '', ...sheet.checks.map((line) => `- ${line}`), '');
  return lines;
}

/** The page in Markdown, with a newline at its end. */
export function workingsPage(): string {
  return [
    '# Workings',
    '',
    'The bench calculations, each with its formula, an example, where it stops being valid, its source, and what its numbers were',
    'held against. Inputs are in SI units; nothing is rounded inside. Where a figure says “common practice, no source”, it is just that.',
    '',
    'This page is made from the sheets. Local codes, the maker’s data and licensed practice come first.',
    '',
    ...SHEETS.flatMap(section),
  ].join('\n');
}
