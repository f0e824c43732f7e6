/** One entry of a record, as a row. */
import { View } from 'react-native';

import type { Person } from '@/shared/contract/people';
import type { Finding } from '@/shared/contract/records';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Mono } from '@/shared/ui/components/Mono';
import { PowerPattern } from '@/shared/ui/components/PowerPattern';
import { entryWords } from '@/shared/ui/screens/records/entryWords';
import { entryAnchor } from '@/shared/ui/screens/records/goToEntry';
import type { ReplayedEntry } from '@/shared/ui/screens/records/replayRecord';
import { secondsClockWords } from '@/shared/ui/screens/shell/dateWords';
import { personCode, personName } from '@/shared/ui/screens/shell/personName';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  replayed: ReplayedEntry;
  people: readonly Person[];
  known: Parameters<typeof entryWords>[1];
  findings: readonly Finding[];
  onRemark: ((entry: string) => void) | null;
}

/** Number, time, person, act; what was remarked on it stands below. */
export function TimelineEntry({ replayed, people, known, findings, onRemark }: Props) {
  const { colors } = useTheme();
  const { entry, after, event } = replayed;
  const { what, detail } = entryWords(replayed, known);
  return (
    <View
      role="listitem"
      nativeID={entryAnchor(entry.id)}
      tabIndex={-1}
      style={{ flexDirection: 'row', gap: space.m, borderBottomWidth: line.hair, borderBottomColor: colors.rule }}
    >
      <View style={{ width: 10, overflow: 'hidden' }} aria-hidden>
        {after && event ? <PowerPattern state={after.band} width="100%" height="100%" /> : null}
      </View>
      <View style={{ flex: 1, minWidth: 0, paddingVertical: space.s, gap: 2 }}>
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.m, alignItems: 'baseline' }}>
          <Mono bold>{entry.seq}</Mono>
          <Mono soft>{secondsClockWords(entry.at)}</Mono>
          <View role="group" aria-label={personName(people, entry.actor)}>
            <BodyText size="small" tone="soft">
              {personCode(people, entry.actor)}
            </BodyText>
          </View>
        </View>
        <BodyText>{what}</BodyText>
        {detail ? (
          <BodyText size="small" tone="soft">
            {detail}
          </BodyText>
        ) : null}
        {findings.map((f) => (
          <BodyText key={f.id} size="small" tone="brass">{`${f.grade}: ${f.text}`}</BodyText>
        ))}
      </View>
      {onRemark ? (
        <View style={{ justifyContent: 'center' }}>
          <Button kind="quiet" icon="pencil" label="Remark" name={`Remark on entry ${entry.seq}`} onPress={() => onRemark(entry.id)} />
        </View>
      ) : null}
    </View>
  );
}
