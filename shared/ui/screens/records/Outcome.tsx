/** What came out of a run, in the fewest rows. */
import { View } from 'react-native';

import type { RunView } from '@/flows/machine/view';
import type { RecordView } from '@/shared/contract/records';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Tag } from '@/shared/ui/components/Tag';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';
import { FactRows } from '@/shared/ui/screens/shell/FactRows';
import type { FactRow } from '@/shared/ui/screens/shell/FactRows';
import { personName } from '@/shared/ui/screens/shell/personName';
import { RUN_STATE_TAGS, RUN_STATE_WORDS } from '@/shared/ui/screens/shell/runWords';
import { space } from '@/shared/ui/theme/space';

interface Props {
  record: RecordView;
  end: RunView['end'];
}

/** State of the review, what to replace and test again, and the release where one was given or made void. */
export function Outcome({ record: { run, people, entries }, end }: Props) {
  const released = entries.find((e) => e.kind === 'released');
  const voided = entries.find((e) => e.kind === 'void');
  const rows: FactRow[] = [
    { name: 'State', value: <Tag word={RUN_STATE_WORDS[run.state]} kind={RUN_STATE_TAGS[run.state]} /> },
    { name: 'Restorer', value: personName(people, run.restorer) },
    { name: 'Closed', value: run.closedAt ? dateTimeWords(run.closedAt) : 'not yet' },
    ...(end?.replace ? [{ name: 'Replace', value: end.replace }] : []),
    ...(end?.retest ? [{ name: 'Test again', value: end.retest }] : []),
    ...(released
      ? [
          {
            name: 'Release',
            value: voided
              ? `Given ${dateTimeWords(released.at)}, void since ${dateTimeWords(voided.at)}`
              : `Supply proven, may be refitted: given ${dateTimeWords(released.at)}`,
          },
        ]
      : []),
  ];
  return (
    <View style={{ gap: space.xs }}>
      <FactRows caption="Outcome" rows={rows} />
      <LinkText label={`${run.machine.name}, serial ${run.machine.serial}`} href={`/machines/${run.machine.id}`} />
    </View>
  );
}
