/** Title of a step, with the tree that it belongs to and where the answers are. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Heading } from '@/shared/ui/components/Heading';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { Label } from '@/shared/ui/components/Label';
import { LinkText } from '@/shared/ui/components/LinkText';
import { savedWords } from '@/shared/ui/screens/run/savedWords';
import { useLongWait } from '@/shared/ui/screens/run/useLongWait';
import type { Run } from '@/shared/ui/screens/run/Run';
import { space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** The one level-1 heading of the screen. */
export function StepHead({ run, title }: { run: Run; title?: string }) {
  const { colors } = useTheme();
  const { saved, view, bundle } = run;
  const signedOut = saved.waiting > 0 && (saved.trouble?.code === 'signed-out' || saved.trouble?.code === 'session-expired');
  const waits = useLongWait(saved);
  return (
    <View style={{ gap: space.xs }}>
      <Label>{view.builtIn ? 'Make safe' : bundle.tree.title}</Label>
      <Heading level={1}>{title ?? view.title}</Heading>
      <View role="status" style={{ flexDirection: 'row', gap: space.s, alignItems: 'center' }}>
        {waits ? (
          <>
            <Icon name="unsent" size={20} color={colors.brass} />
            <View style={{ flexShrink: 1 }}>
              <BodyText size="small" tone="brass">
                {savedWords(saved)}
              </BodyText>
            </View>
          </>
        ) : null}
      </View>
      {signedOut ? (
        <LinkText label="Sign in, and come back here" href={`/sign-in?from=${encodeURIComponent(`/bench/${bundle.run.id}`)}&expired=1`} />
      ) : null}
    </View>
  );
}
