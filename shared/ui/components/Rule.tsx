/** A ruled line across its container. */
import { View } from 'react-native';

import { line } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  /** `strong` opens a part, `hair` parts rows */
  weight?: 'hair' | 'strong' | undefined;
}

/** Parts what is above from what is below. */
export function Rule({ weight = 'hair' }: Props) {
  const { colors } = useTheme();
  const strong = weight === 'strong';
  return (
    <View
      role="none"
      style={{ height: strong ? line.rule : line.hair, backgroundColor: strong ? colors.ink : colors.rule, alignSelf: 'stretch' }}
    />
  );
}
