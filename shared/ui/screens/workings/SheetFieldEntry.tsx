/** One input of a bench calculation. */
import { Field } from '@/shared/ui/components/Field';
import { Select } from '@/shared/ui/components/Select';
import { choiceWords } from '@/shared/ui/screens/workings/choiceWords';
import { unitOf } from '@/shared/ui/screens/workings/sheetForm';
import type { SheetField, SheetTexts } from '@/shared/ui/screens/workings/sheetPart';

/** What is typed, and what is known of it. */
export interface FieldStanding {
  texts: SheetTexts;
  errors: Readonly<Record<string, string>>;
  echoes: Readonly<Record<string, string>>;
  /** names of fields that stand as the machine's profile says, and that machine */
  taken: { machine: string; names: ReadonlySet<string> } | null;
}

interface Props extends FieldStanding {
  field: SheetField;
  /** under which it is typed; `rails.0.volts` in a list */
  name: string;
  /** what it belongs to, as “rail 2”; said with its name to a reader */
  within?: string | undefined;
  onChange: (name: string, text: string) => void;
}

const NO_CHOICE = '';

/** Says its unit, what it has understood, and where its value comes from. */
export function SheetFieldEntry({ field, name, within, texts, errors, echoes, taken, onChange }: Props) {
  const unit = unitOf(field, texts);
  const text = texts[name] ?? '';
  const echo = echoes[name];
  // an entry that reads as it is printed needs no echo
  const understood = echo && echo !== `${text} ${unit ?? ''}` ? `= ${echo}` : null;
  const source = taken !== null && taken.names.has(name) ? `from the profile of ${taken.machine}` : null;
  const hint = [understood, source, field.description].filter((part) => part !== null && part !== '').join('. ');
  const label = `${field.title}${unit === null || unit === '' ? '' : `, ${unit}`}`;
  if (field.choices !== null) {
    const options = field.choices.map((value) => ({ value, label: choiceWords(value) }));
    return (
      <Select
        label={field.title}
        within={within}
        options={field.optional ? [{ value: NO_CHOICE, label: 'not given' }, ...options] : options}
        value={text === '' && !field.optional ? null : text}
        onChange={(value) => onChange(name, value)}
        error={errors[name]}
        hint={[source, field.description].filter((part) => part !== null && part !== '').join('. ')}
      />
    );
  }
  return (
    <Field
      label={label}
      within={within}
      required={!field.optional}
      value={text}
      onChangeText={(typed) => onChange(name, typed)}
      error={errors[name]}
      hint={hint}
      inputMode="text"
      autoComplete="off"
    />
  );
}
