/** A button of ordinary size. */
import { Text } from 'react-native';

import { Icon } from '@/shared/ui/components/icons/Icon';
import type { IconName } from '@/shared/ui/components/icons/iconPaths';
import { Press } from '@/shared/ui/components/Press';
import type { PressProps } from '@/shared/ui/components/Press';
import { type } from '@/shared/ui/theme/type';

interface Props extends PressProps {
  label: string;
  icon?: IconName | undefined;
}

/** Does one thing now; at most one `primary` a page. For going somewhere use `LinkText`. */
export function Button({ label, icon, ...press }: Props) {
  return (
    <Press {...press}>
      {(word) => (
        <>
          {icon ? <Icon name={icon} size={22} color={word} /> : null}
          <Text style={[type.button, { color: word, textAlign: 'center' }]}>{label}</Text>
        </>
      )}
    </Press>
  );
}
