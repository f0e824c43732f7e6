/** Underlined words that lead somewhere. */
import type { Href } from 'expo-router';
import { Text } from 'react-native';

import { RouteLink } from '@/shared/ui/components/RouteLink';
import { target } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  label: string;
  href: Href;
  name?: string | undefined;
}

/** A link on a line of its own, tall enough to hit. */
export function LinkText({ label, href, name }: Props) {
  const { colors } = useTheme();
  return (
    <RouteLink href={href} name={name} style={() => [{ minHeight: target.control, justifyContent: 'center', alignSelf: 'flex-start' }]}>
      <Text style={[type.body, { color: colors.action, textDecorationLine: 'underline' }]}>{label}</Text>
    </RouteLink>
  );
}
