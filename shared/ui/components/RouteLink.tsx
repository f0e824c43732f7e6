/** The one place that turns an address of the app into something to press. */
import { Link } from 'expo-router';
import type { Href } from 'expo-router';
import { useState } from 'react';
import type { ReactNode } from 'react';
import { Pressable, StyleSheet } from 'react-native';
import type { ViewStyle } from 'react-native';

import { webProps } from '@/shared/ui/theme/webStyle';

interface Props {
  href: Href;
  /** what a screen reader says when the words inside are not enough */
  name?: string | undefined;
  current?: boolean | undefined;
  /** the focus ring goes inside, where there is no room around it */
  ringInside?: boolean | undefined;
  style: (hovered: boolean) => (ViewStyle | null | undefined)[];
  children: ReactNode;
}

/** A link by role, with an address that can be opened in a new tab. */
export function RouteLink({ href, name, current = false, ringInside = false, style, children }: Props) {
  const [hovered, setHovered] = useState(false);
  // the router's slot merges styles as objects and would lose a style that is a function
  return (
    <Link href={href} asChild>
      <Pressable
        role="link"
        {...(name ? { 'aria-label': name } : {})}
        {...webProps({ ...(current ? { 'aria-current': 'page' } : {}), ...(ringInside ? { dataSet: { ring: 'inside' } } : {}) })}
        onHoverIn={() => setHovered(true)}
        onHoverOut={() => setHovered(false)}
        style={StyleSheet.flatten(style(hovered))}
      >
        {children}
      </Pressable>
    </Link>
  );
}
