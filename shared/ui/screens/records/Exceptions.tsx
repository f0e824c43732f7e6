/** "Look at these first". */
import { useState } from 'react';
import { Pressable, View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { StepStud } from '@/shared/ui/components/StepStud';
import type { RecordException } from '@/shared/ui/screens/records/exceptionsOf';
import { goToEntry } from '@/shared/ui/screens/records/goToEntry';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

const FIRST = 8;

/** Each is a button that leads to its entry; the number in the stud is the entry's. */
export function Exceptions({ exceptions }: { exceptions: readonly RecordException[] }) {
  const { colors } = useTheme();
  const [all, setAll] = useState(false);
  const shown = all ? exceptions : exceptions.slice(0, FIRST);
  const rest = exceptions.length - shown.length;
  if (exceptions.length === 0)
    return <BodyText tone="soft">Nothing stands out: every reading clear of its limits, no Stop, no refusal, no doubt, no haste.</BodyText>;
  return (
    <View>
      <View role="list" aria-label="Look at these first">
        {shown.map((e) => (
          <View key={`${e.kind}-${e.entry}`} role="listitem" style={{ borderBottomWidth: line.hair, borderBottomColor: colors.rule }}>
            <Pressable
              role="button"
              aria-label={`Entry ${e.seq}: ${e.title}, ${e.detail}`}
              onPress={() => goToEntry(e.entry)}
              style={{ flexDirection: 'row', gap: space.m, alignItems: 'center', paddingVertical: space.m }}
            >
              <StepStud number={e.seq} state={e.kind === 'close' || e.kind === 'out' || e.kind === 'stopped' ? 'close' : 'done'} />
              <View style={{ flex: 1, minWidth: 0 }}>
                <BodyText bold>{e.title}</BodyText>
                <BodyText size="small" tone="soft">
                  {e.detail}
                </BodyText>
              </View>
            </Pressable>
          </View>
        ))}
      </View>
      {rest > 0 ? (
        <View style={{ paddingTop: space.m, alignItems: 'flex-start' }}>
          <Button kind="quiet" label={`Show the other ${rest}`} onPress={() => setAll(true)} />
        </View>
      ) : null}
    </View>
  );
}
