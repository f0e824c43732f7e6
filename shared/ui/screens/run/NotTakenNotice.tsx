/** Answers that the server did not take: kept, shown, and read once. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';
import { clockWords } from '@/shared/ui/screens/shell/dateWords';
import { space } from '@/shared/ui/theme/space';

/** Nothing is shown once they have been read; the way keeps them. */
export function NotTakenNotice({ run }: { run: Run }) {
  const unread = run.saved.notTaken.filter((q) => !q.seen);
  const first = unread[0];
  if (first === undefined) return null;
  const title = unread.length === 1 ? 'An answer was not taken' : `${unread.length} answers were not taken`;
  return (
    <Notice live kind="alarm" title={title}>
      <View style={{ gap: space.s }}>
        <BodyText>
          {first.notTaken?.rule ? `House rule ${first.notTaken.rule}: ${first.notTaken.say}` : (first.notTaken?.say ?? '')}
        </BodyText>
        <BodyText>{`Nobody can say what is true at the bench now: make it safe first. What you answered at ${clockWords(first.event.at)} and after is kept on this device.`}</BodyText>
        <Button label="I have read this" onPress={run.markSeen} />
      </View>
    </Notice>
  );
}
