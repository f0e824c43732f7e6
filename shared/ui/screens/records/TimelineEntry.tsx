/** One entry of a record, as a row. */
import { Text, useWindowDimensions, View } from 'react-native';

import type { Person } from '@/shared/contract/people';
import type { Finding } from '@/shared/contract/records';
import { fileAddress } from '@/shared/ui/api/fileAddress';
import { BodyText } from '@/shared/ui/components/BodyText';
import { FileLink } from '@/shared/ui/components/FileLink';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { Mono } from '@/shared/ui/components/Mono';
import { Photo } from '@/shared/ui/components/Photo';
import { PowerPattern } from '@/shared/ui/components/PowerPattern';
import { Press } from '@/shared/ui/components/Press';
import { entryWords } from '@/shared/ui/screens/records/entryWords';
import { entryAnchor } from '@/shared/ui/screens/records/goToEntry';
import type { ReplayedEntry } from '@/shared/ui/screens/records/replayRecord';
import { secondsClockWords } from '@/shared/ui/screens/shell/dateWords';
import { personCode, personName } from '@/shared/ui/screens/shell/personName';
import { isWide, line, space, target } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
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
  const wide = isWide(useWindowDimensions().width);
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
        {after && event ? (
          // out of the flow: a drawing has a height of its own, which must not stretch the row
          <View style={{ position: 'absolute', top: 0, bottom: 0, left: 0, right: 0 }}>
            <PowerPattern state={after.band} width="100%" height="100%" />
          </View>
        ) : null}
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
        {event?.type === 'PHOTO' ? <EntryPhoto hash={event.photo} seq={entry.seq} /> : null}
        {findings.map((f) => (
          <BodyText key={f.id} size="small" tone="brass">{`${f.grade}: ${f.text}`}</BodyText>
        ))}
      </View>
      {onRemark ? (
        <View style={{ justifyContent: 'flex-start' }}>
          <Press
            kind="quiet"
            name={`Remark on entry ${entry.seq}`}
            style={{ minWidth: target.control, paddingHorizontal: space.s }}
            onPress={() => onRemark(entry.id)}
          >
            {(word) => (
              <>
                <Icon name="pencil" size={22} color={word} />
                {wide ? <Text style={[type.button, { color: word }]}>Remark</Text> : null}
              </>
            )}
          </Press>
        </View>
      ) : null}
    </View>
  );
}

/** Small in the list; the link opens it whole. */
function EntryPhoto({ hash, seq }: { hash: string; seq: number }) {
  return (
    <View style={{ maxWidth: 240, gap: 2 }}>
      <Photo source={fileAddress(hash, 'small')} says={`Photo of entry ${seq}`} />
      <FileLink href={fileAddress(hash)} label="Open it whole" name={`Open the photo of entry ${seq} whole`} />
    </View>
  );
}
