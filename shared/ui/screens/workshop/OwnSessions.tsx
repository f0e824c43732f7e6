/** Where one is signed in, and a way to end it there. */
import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';

import type { OwnSession } from '@/shared/contract/account';
import { client } from '@/shared/ui/api/client';
import { queryKeyOf, useRoute } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Notice } from '@/shared/ui/components/Notice';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { Section } from '@/shared/ui/screens/shell/Section';
import { deviceWords } from '@/shared/ui/screens/workshop/deviceWords';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** Answers that wait on another device stay there until one signs in on it again. */
export function OwnSessions() {
  const sessions = useRoute('sessions', {});
  const queries = useQueryClient();
  const [problem, setProblem] = useState<string | null>(null);
  const [ending, setEnding] = useState<string | null>(null);
  const end = async (session: string) => {
    setEnding(session);
    const answer = await client.call('endSession', { params: { session } });
    setEnding(null);
    setProblem(answer.kind === 'problem' ? answer.say : null);
    await queries.invalidateQueries({ queryKey: queryKeyOf('sessions') });
  };
  return (
    <Section title="Signed in on">
      {problem === null ? null : <Notice live>{problem}</Notice>}
      <Fetched query={sessions} what="your sessions">
        {({ sessions: all }) => (
          <View role="list" aria-label="Signed in on">
            {all.map((session) => (
              <SessionRow key={session.id} session={session} busy={ending === session.id} onEnd={() => void end(session.id)} />
            ))}
          </View>
        )}
      </Fetched>
    </Section>
  );
}

function SessionRow({ session, busy, onEnd }: { session: OwnSession; busy: boolean; onEnd: () => void }) {
  const { colors } = useTheme();
  const words = deviceWords(session.device);
  return (
    <View
      role="listitem"
      style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.m, paddingVertical: space.s, borderBottomWidth: line.hair, borderBottomColor: colors.rule }}
    >
      <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 220 }}>
        <BodyText bold={session.current}>{session.current ? `${words} (this one)` : words}</BodyText>
        <BodyText size="small" tone="soft">{`Signed in ${dateTimeWords(session.since)}, last seen ${dateTimeWords(session.lastSeen)}`}</BodyText>
      </View>
      {session.current ? null : <Button label={busy ? 'Ending …' : 'End'} name={`End the session of ${words}, signed in ${dateTimeWords(session.since)}`} disabled={busy} onPress={onEnd} />}
    </View>
  );
}
