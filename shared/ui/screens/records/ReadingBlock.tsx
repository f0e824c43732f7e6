/** One reading of a record on a phone: its scale has the whole width. */
import { Pressable, View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Mono } from '@/shared/ui/components/Mono';
import { Verdict } from '@/shared/ui/components/Verdict';
import { goToEntry } from '@/shared/ui/screens/records/goToEntry';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import { RecordScale } from '@/shared/ui/screens/records/RecordScale';
import { line, space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** The number leads to the entry. */
export function ReadingBlock({ reading }: { reading: ReadingLine }) {
  const { colors } = useTheme();
  return (
    <View role="listitem" style={{ paddingVertical: space.m, gap: space.xs, borderBottomWidth: line.hair, borderBottomColor: colors.rule }}>
      <View style={{ flexDirection: 'row', gap: space.m, alignItems: 'flex-start' }}>
        <Pressable
          role="button"
          aria-label={`Entry ${reading.seq}`}
          onPress={() => goToEntry(reading.id)}
          style={{ minWidth: target.control, minHeight: target.control, justifyContent: 'flex-start' }}
        >
          <Mono whole>{reading.seq}</Mono>
        </Pressable>
        <View style={{ flex: 1, minWidth: 0 }}>
          <BodyText bold>{reading.label}</BodyText>
          <BodyText size="small" tone="soft">
            {reading.step}
          </BodyText>
        </View>
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', gap: space.m }}>
        <Mono bold whole>
          {reading.reading}
        </Mono>
        <Verdict mark={reading.mark} word={reading.verdict} />
      </View>
      <RecordScale reading={reading} />
    </View>
  );
}
