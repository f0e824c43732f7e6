/** Underlined words that open a kept file beside the page. */
import { Linking, Text } from 'react-native';

import { target } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webTextStyle } from '@/shared/ui/theme/webStyle';

interface Props {
  /** address of the file */
  href: string;
  label: string;
  /** the words for those who hear the page, where the label alone does not say which file */
  name?: string | undefined;
}

const beside = { href: '', hrefAttrs: { target: 'blank', rel: 'noreferrer' } };

/** A link out of the pages: the place on this page stays as it is. */
export function FileLink({ href, label, name = label }: Props) {
  const { colors } = useTheme();
  return (
    <Text
      role="link"
      aria-label={name}
      // the web's own attributes, which the common types do not know
      {...({ ...beside, href } as object)}
      {...(typeof document === 'undefined' ? { onPress: () => void Linking.openURL(href) } : {})}
      style={[type.body, { color: colors.action, textDecorationLine: 'underline', minHeight: target.control, lineHeight: target.control }, webTextStyle({ alignSelf: 'flex-start' })]}
    >
      {label}
    </Text>
  );
}
