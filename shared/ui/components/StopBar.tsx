/** "Stop, make safe": the bar at the foot of every run screen, always at the same place. */
import { Pressable, Text } from 'react-native';

import { Icon } from '@/shared/ui/components/icons/Icon';
import { safety } from '@/shared/ui/theme/palette';
import { space, target } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { webProps, webStyle } from '@/shared/ui/theme/webStyle';

interface Props {
  onPress: () => void;
}

/** One touch, never disabled. Put it in the foot of a `Page`, or of a `Dialog` that covers one. */
export function StopBar({ onPress }: Props) {
  return (
    <Pressable
      role="button"
      onPress={onPress}
      style={({ pressed }) => [
        {
          minHeight: target.stop,
          flexDirection: 'row',
          alignItems: 'center',
          justifyContent: 'center',
          gap: space.m,
          backgroundColor: pressed ? safety.black : safety.red,
          alignSelf: 'stretch',
        },
        webStyle({ paddingBottom: 'env(safe-area-inset-bottom)', color: safety.white }),
      ]}
      {...webProps({ dataSet: { ring: 'inside' } })}
    >
      <Icon name="stop" size={32} color={safety.white} weight={2.2} />
      <Text style={[type.section, { color: safety.white, letterSpacing: 1.6 }]}>STOP, MAKE SAFE</Text>
    </Pressable>
  );
}
