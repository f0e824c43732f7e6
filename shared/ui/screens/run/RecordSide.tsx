/** The record so far, newest first, and the suspects. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Label } from '@/shared/ui/components/Label';
import { Mono } from '@/shared/ui/components/Mono';
import type { Run } from '@/shared/ui/screens/run/Run';
import { savedWords } from '@/shared/ui/screens/run/savedWords';
import { Suspects } from '@/shared/ui/screens/run/Suspects';
import { clockWords } from '@/shared/ui/screens/shell/dateWords';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

const MOST = 60;

/** What was answered, by the reader's clock. */
export function RecordSide({ run }: { run: Run }) {
  const { colors } = useTheme();
  const { lines } = run.account;
  return (
    <>
      <Suspects run={run} />
      <View>
        <Label level={2}>Record so far</Label>
        <BodyText size="small" tone="soft">
          {savedWords(run.saved)}
        </BodyText>
        {lines.length === 0 ? <BodyText size="small">Nothing has been answered yet.</BodyText> : null}
        <View role="list" aria-label="Record so far">
          {[...lines]
            .reverse()
            .slice(0, MOST)
            .map((l, i) => (
              <View
                key={lines.length - i}
                role="listitem"
                style={{
                  flexDirection: 'row',
                  gap: space.m,
                  paddingVertical: space.s,
                  borderBottomWidth: line.hair,
                  borderBottomColor: colors.rule,
                }}
              >
                <Mono soft>{clockWords(l.at)}</Mono>
                <View style={{ flex: 1, minWidth: 0 }}>
                  <BodyText
                    size="small"
                    bold={l.verdict === 'fail'}
                    tone={l.verdict === 'unsure' || l.verdict === 'fail' ? 'brass' : 'ink'}
                  >
                    {l.words}
                  </BodyText>
                  <BodyText size="small" tone="soft">
                    {l.stud === '' || l.stud === '!' ? l.title : `${l.stud} ${l.title}`}
                  </BodyText>
                </View>
              </View>
            ))}
        </View>
      </View>
      {run.saved.notTaken.length > 0 ? (
        <View>
          <Label level={2}>Not taken, kept on this device</Label>
          {run.saved.notTaken.map((q) => (
            <BodyText
              key={q.id}
              size="small"
            >{`${clockWords(q.event.at)} ${q.event.type === 'READING' ? q.event.typed : q.event.type === 'ANSWER' ? q.event.answer : q.event.type.toLowerCase()}: ${q.notTaken?.say ?? ''}`}</BodyText>
          ))}
        </View>
      ) : null}
    </>
  );
}
