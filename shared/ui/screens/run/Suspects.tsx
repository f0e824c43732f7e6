/** The suspects of the tree, most likely first, in words. */
import { View } from 'react-native';

import { posterior, shareInWords } from '@/flows/evidence/posterior';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Label } from '@/shared/ui/components/Label';
import type { Run } from '@/shared/ui/screens/run/Run';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

const MODES: Readonly<Record<string, string>> = { 'no-contact': 'no contact', 'low-value': 'low in value', 'fires-early': 'fires early' };
const MOST = 5;

/** Before anything has been heard of them there is nothing to rank. */
export function Suspects({ run }: { run: Run }) {
  const { colors } = useTheme();
  const ranked = posterior(run.program.layout.tree.suspects, run.account.findings);
  if (ranked.every((r) => r.heard === 0)) return null;
  return (
    <View>
      <Label level={2}>Suspects</Label>
      <View role="list" aria-label="Suspects">
        {ranked.slice(0, MOST).map((r) => (
          <View
            key={r.suspect.id}
            role="listitem"
            style={{
              flexDirection: 'row',
              justifyContent: 'space-between',
              gap: space.m,
              paddingVertical: space.s,
              borderBottomWidth: line.hair,
              borderBottomColor: colors.rule,
            }}
          >
            <View style={{ flex: 1, minWidth: 0 }}>
              <BodyText size="small">{`${r.suspect.part}, ${MODES[r.suspect.mode] ?? r.suspect.mode}`}</BodyText>
            </View>
            <BodyText size="small" bold>
              {shareInWords(r.share)}
            </BodyText>
          </View>
        ))}
      </View>
    </View>
  );
}
