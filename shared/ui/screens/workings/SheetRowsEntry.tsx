/** A list of alike rows: rails, wires, readings. On a phone one row is open at a time; the others are told on a line. */
import { useState } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { FieldError } from '@/shared/ui/components/FieldError';
import { Heading } from '@/shared/ui/components/Heading';
import { SheetFieldEntry } from '@/shared/ui/screens/workings/SheetFieldEntry';
import type { FieldStanding } from '@/shared/ui/screens/workings/SheetFieldEntry';
import type { SheetList } from '@/shared/ui/screens/workings/sheetPart';
import { cellName, rowCount, withoutRow, withRow } from '@/shared/ui/screens/workings/sheetRows';
import { rowWords } from '@/shared/ui/screens/workings/rowWords';
import { line, space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props extends FieldStanding {
  list: SheetList;
  onChange: (name: string, text: string) => void;
  onReplace: (texts: Record<string, string>) => void;
}

/** Rows can be opened, added and taken out; a row with a fault is opened by itself. */
export function SheetRowsEntry({ list, onChange, onReplace, ...standing }: Props) {
  const { colors } = useTheme();
  const { texts, errors } = standing;
  const [open, setOpen] = useState<ReadonlySet<number>>(new Set());
  const count = rowCount(list, texts);
  const own = errors[list.name];
  const add = () => {
    setOpen(new Set([count]));
    onReplace(withRow(list, texts));
  };
  const remove = (row: number) => {
    setOpen(new Set());
    onReplace(withoutRow(list, texts, row));
  };
  const turn = (row: number) => setOpen(open.has(row) ? new Set([...open].filter((r) => r !== row)) : new Set([...open, row]));
  return (
    <View
      role="group"
      aria-label={list.title}
      style={{ gap: space.s, borderTopWidth: line.rule, borderTopColor: colors.ink, paddingTop: space.m }}
    >
      <Heading level={3}>{list.title}</Heading>
      {list.description === '' ? null : (
        <BodyText size="small" tone="soft">
          {list.description}
        </BodyText>
      )}
      {own === undefined ? null : <FieldError id={`${list.name}-fault`} text={own} />}
      {count === 0 ? <BodyText tone="soft">{`No ${list.rowName} yet.`}</BodyText> : null}
      {Array.from({ length: count }, (_, row) => {
        const faulty = Object.keys(errors).some((key) => key === `${list.name}.${row}` || key.startsWith(`${list.name}.${row}.`));
        return (
          <Row
            key={row}
            list={list}
            row={row}
            shown={faulty || open.has(row)}
            mayGo={count > list.fewest}
            onTurn={faulty ? null : () => turn(row)}
            onRemove={() => remove(row)}
            onChange={onChange}
            {...standing}
          />
        );
      })}
      {count < list.most ? (
        <View style={{ flexDirection: 'row' }}>
          <Button label={`Add a ${list.rowName}`} icon="plus" onPress={add} />
        </View>
      ) : (
        <BodyText size="small" tone="soft">{`This sheet takes ${list.most} at most.`}</BodyText>
      )}
    </View>
  );
}

interface RowProps extends FieldStanding {
  list: SheetList;
  row: number;
  shown: boolean;
  mayGo: boolean;
  /** null while a fault keeps it open */
  onTurn: (() => void) | null;
  onRemove: () => void;
  onChange: (name: string, text: string) => void;
}

function Row({ list, row, shown, mayGo, onTurn, onRemove, onChange, ...standing }: RowProps) {
  const { colors } = useTheme();
  const within = `${list.rowName} ${row + 1}`;
  const own = standing.errors[`${list.name}.${row}`];
  const words = rowWords(list, row, standing.texts, standing.echoes);
  return (
    <View role="group" aria-label={within} style={{ borderWidth: line.hair, borderColor: colors.rule, backgroundColor: colors.raised }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s, paddingLeft: space.m, minHeight: target.control }}>
        <View style={{ flex: 1, minWidth: 0, paddingVertical: space.xs }}>
          <BodyText bold>{words.title === within ? within : `${row + 1}  ${words.title}`}</BodyText>
          {shown || words.detail === '' ? null : (
            <BodyText size="small" tone="soft">
              {words.detail}
            </BodyText>
          )}
        </View>
        {onTurn === null ? null : (
          <Button
            kind="quiet"
            ground={colors.raised}
            label={shown ? 'Fold' : 'Change'}
            name={`${shown ? 'Fold' : 'Change'} ${within}`}
            onPress={onTurn}
          />
        )}
      </View>
      {own === undefined ? null : (
        <View style={{ paddingHorizontal: space.m }}>
          <FieldError id={`${list.name}-${row}-fault`} text={own} />
        </View>
      )}
      {shown ? (
        <View style={{ padding: space.m, gap: space.m }}>
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.l, rowGap: space.m }}>
            {list.columns.map((column) => (
              <View key={column.name} style={{ flexGrow: 1, flexShrink: 1, flexBasis: 230, minWidth: 0 }}>
                <SheetFieldEntry field={column} name={cellName(list, row, column)} within={within} onChange={onChange} {...standing} />
              </View>
            ))}
          </View>
          {mayGo ? (
            <View style={{ flexDirection: 'row' }}>
              <Button label={`Take out ${within}`} icon="none" ground={colors.raised} onPress={onRemove} />
            </View>
          ) : null}
        </View>
      ) : null}
    </View>
  );
}
