/** What reviewers have remarked on, and the questions that wait for an answer. */
import { Pressable, View } from 'react-native';

import type { RecordView } from '@/shared/contract/records';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Tag } from '@/shared/ui/components/Tag';
import { goToEntry } from '@/shared/ui/screens/records/goToEntry';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';
import { personName } from '@/shared/ui/screens/shell/personName';
import { Section } from '@/shared/ui/screens/shell/Section';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** Nothing where there is neither. */
export function Findings({ record }: { record: RecordView }) {
  const { colors } = useTheme();
  const { findings, people, entries } = record;
  const returned = entries.filter((e) => e.kind === 'returned' || e.kind === 'reply');
  if (findings.length === 0 && returned.length === 0) return null;
  return (
    <>
      {findings.length > 0 ? (
        <Section title="Findings" look="label">
          <View role="list" aria-label="Findings">
            {findings.map((f) => {
              const seq = entries.find((e) => e.id === f.entry)?.seq ?? 0;
              return (
                <View key={f.id} role="listitem" style={{ borderBottomWidth: line.hair, borderBottomColor: colors.rule }}>
                  <Pressable
                    role="button"
                    aria-label={`Finding, ${f.grade}, on entry ${seq}: ${f.text}`}
                    onPress={() => goToEntry(f.entry)}
                    style={{ gap: space.xs, paddingVertical: space.m }}
                  >
                    <View style={{ flexDirection: 'row', gap: space.m, alignItems: 'center' }}>
                      <Tag word={f.grade} kind={f.grade === 'note' ? 'plain' : 'look'} />
                      <BodyText size="small" tone="soft">{`entry ${seq}, ${personName(people, f.by)}, ${dateTimeWords(f.at)}`}</BodyText>
                    </View>
                    <BodyText>{f.text}</BodyText>
                  </Pressable>
                </View>
              );
            })}
          </View>
        </Section>
      ) : null}
      {returned.length > 0 ? (
        <Section title="Questions and answers" look="label">
          {returned.map((entry) => (
            <View
              key={entry.id}
              style={{
                borderLeftWidth: line.heavy + 1,
                borderLeftColor: entry.kind === 'returned' ? colors.brass : colors.rule,
                paddingLeft: space.m,
                gap: space.xs,
              }}
            >
              <BodyText size="small" tone="soft">{`${personName(people, entry.actor)}, ${dateTimeWords(entry.at)}`}</BodyText>
              {textsOf(entry.body).map((words) => (
                <BodyText key={words}>{words}</BodyText>
              ))}
            </View>
          ))}
        </Section>
      ) : null}
    </>
  );
}

function textsOf(body: RecordView['entries'][number]['body']): string[] {
  const questions = body['questions'];
  return Array.isArray(questions) ? questions.map((q, i) => `${i + 1}. ${String(q)}`) : [String(body['text'] ?? '')];
}
