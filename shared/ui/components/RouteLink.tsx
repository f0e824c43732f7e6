/** The one place that turns an address of the app into something to press. */
import { Link } from 'expo-router';
import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { Pressable } from 'react-native';
import type { ViewStyle } from 'react-native';

import { webProps } from '@/shared/ui/theme/webStyle';

export interface RouteState {
  pressed: boolean;
  hovered?: boolean;
}

interface Props {
  href: Href;
  /** what a screen reader says when the words inside are not enough */
  name?: string | undefined;
  current?: boolean | undefined;
  /** the focus ring goes inside, where there is no room around it */
  ringInside?: boolean | undefined;
  style: (state: RouteState) => (ViewStyle | null | undefined)[];
  children: ReactNode;
}

/** A link by role, with an address that can be opened in a new tab. */
export function RouteLink({ href, name, current = false, ringInside = false, style, children }: Props) {
  return (
    <Link href={href} asChild>
      <Pressable role="link" {...(name ? { 'aria-label': name } : {})} {...(current ? { 'aria-current': 'page' } : {})} {...webProps(ringInside ? { dataSet: { ring: 'inside' } } : {})} style={style}>
        {children}
      </Pressable>
    </Link>
  );
}
