/** The inputs of a bench calculation. */
import { useWindowDimensions, View } from 'react-native';

import { SheetFieldEntry } from '@/shared/ui/screens/workings/SheetFieldEntry';
import type { FieldStanding } from '@/shared/ui/screens/workings/SheetFieldEntry';
import type { SheetPart } from '@/shared/ui/screens/workings/sheetPart';
import { SheetRowsEntry } from '@/shared/ui/screens/workings/SheetRowsEntry';
import { isWide, space } from '@/shared/ui/theme/space';

interface Props extends FieldStanding {
  parts: readonly SheetPart[];
  onChange: (name: string, text: string) => void;
  /** replaces all that is typed: a row more or less */
  onReplace: (texts: Record<string, string>) => void;
}

/** Two beside each other where there is room; lists take the whole width. */
export function SheetForm({ parts, onChange, onReplace, ...standing }: Props) {
  const wide = isWide(useWindowDimensions().width);
  return (
    <View role="form" aria-label="Inputs" style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.xl, rowGap: space.l }}>
      {parts.map((part) =>
        part.kind === 'rows' ? (
          <View key={part.name} style={{ width: '100%' }}>
            <SheetRowsEntry list={part} onChange={onChange} onReplace={onReplace} {...standing} />
          </View>
        ) : (
          <View key={part.name} style={{ flexGrow: 1, flexShrink: 1, flexBasis: 300, minWidth: 0, maxWidth: wide ? '48%' : '100%' }}>
            <SheetFieldEntry field={part} name={part.name} onChange={onChange} {...standing} />
          </View>
        ),
      )}
    </View>
  );
}
