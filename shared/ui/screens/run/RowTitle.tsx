/** What is asked now, of several; it stands with its answers. */
import { View } from 'react-native';

import type { RowView } from '@/flows/machine/view';
import type { Row } from '@/flows/machine/rows';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';

/** Read out when the row changes. */
export function RowTitle({ rows, current }: { rows: readonly RowView[]; current: Row }) {
  const at = rows.findIndex((r) => r.row.id === current.id);
  return (
    <View role="status" aria-live="polite">
      {rows.length > 1 ? <Label>{`${at + 1} of ${rows.length}`}</Label> : null}
      <Heading level={2} size="sub">
        {current.label}
      </Heading>
      {current.note === undefined ? null : <BodyText size="small">{current.note}</BodyText>}
    </View>
  );
}
