/** The rows of a step that have their answer. */
import { View } from 'react-native';

import type { RowView } from '@/flows/machine/view';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { QUANTITIES } from '@/shared/quantity/quantities';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Label } from '@/shared/ui/components/Label';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** Newest first, so that the last one stands where the eye is. */
export function DoneRows({ rows }: { rows: readonly RowView[] }) {
  const { colors } = useTheme();
  const done = rows.filter((r) => r.answer !== null);
  if (done.length === 0) return null;
  return (
    <View>
      <Label>{`Answered, ${done.length} of ${rows.length}`}</Label>
      <View role="list" aria-label="Answered">
        {[...done].reverse().map((r) => (
          <View
            key={r.row.id}
            role="listitem"
            style={{
              flexDirection: 'row',
              justifyContent: 'space-between',
              gap: space.m,
              paddingVertical: space.xs,
              borderBottomWidth: line.hair,
              borderBottomColor: colors.rule,
            }}
          >
            <View style={{ flex: 1, minWidth: 0 }}>
              <BodyText size="small" tone="soft">
                {r.row.label}
              </BodyText>
            </View>
            <BodyText size="small" bold>
              {answerWords(r)}
            </BodyText>
          </View>
        ))}
      </View>
    </View>
  );
}

function answerWords({ row, answer }: RowView): string {
  if (answer === null) return '';
  if (row.ask === 'word') return row.words.find((w) => w.result === answer.result)?.label ?? answer.result;
  if (answer.value === null) return answer.result === 'cannot' ? 'not measured' : 'not sure';
  return answer.value === 'over' ? 'over range' : formatQuantity(answer.value, QUANTITIES[row.quantity].unit);
}
