/** The inputs of a bench calculation. */
import { useWindowDimensions, View } from 'react-native';

import { Field } from '@/shared/ui/components/Field';
import { Select } from '@/shared/ui/components/Select';
import { choiceWords } from '@/shared/ui/screens/workings/choiceWords';
import { unitOf } from '@/shared/ui/screens/workings/sheetForm';
import type { SheetField, SheetTexts } from '@/shared/ui/screens/workings/sheetForm';
import { isWide, space } from '@/shared/ui/theme/space';

interface Props {
  fields: readonly SheetField[];
  texts: SheetTexts;
  errors: Readonly<Record<string, string>>;
  echoes: Readonly<Record<string, string>>;
  onChange: (name: string, text: string) => void;
}

/** Two beside each other where there is room; each says its unit and what it has understood. */
export function SheetForm({ fields, texts, errors, echoes, onChange }: Props) {
  const wide = isWide(useWindowDimensions().width);
  return (
    <View role="form" aria-label="Inputs" style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.xl, rowGap: space.l }}>
      {fields.map((field) => {
        const unit = unitOf(field, texts);
        const echo = echoes[field.name];
        // an entry that reads as it is printed needs no echo
        const understood = echo && echo !== `${texts[field.name] ?? ''} ${unit ?? ''}` ? `= ${echo}` : null;
        const hint = [understood, field.description].filter((part) => part !== null && part !== '').join('. ');
        return (
          <View key={field.name} style={{ flexGrow: 1, flexShrink: 1, flexBasis: 300, minWidth: 0, maxWidth: wide ? '48%' : '100%' }}>
            {field.choices ? (
              <Select
                label={field.title}
                options={field.choices.map((value) => ({ value, label: choiceWords(value) }))}
                value={texts[field.name] ?? null}
                onChange={(value) => onChange(field.name, value)}
                error={errors[field.name]}
              />
            ) : (
              <Field
                label={unit ? `${field.title}, ${unit}` : field.title}
                required={!field.optional}
                value={texts[field.name] ?? ''}
                onChangeText={(text) => onChange(field.name, text)}
                error={errors[field.name]}
                hint={hint}
                inputMode="text"
                autoComplete="off"
              />
            )}
          </View>
        );
      })}
    </View>
  );
}
