/** The frame that all buttons share: square, ruled, notched when it is the thing to pick up. */
import type { ReactNode } from 'react';
import { Pressable, View } from 'react-native';
import type { ViewStyle } from 'react-native';

import { NotchCorner } from '@/shared/ui/components/NotchCorner';
import { pressVisual } from '@/shared/ui/components/pressVisual';
import type { PressKind } from '@/shared/ui/components/pressVisual';
import { line, space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

export interface PressProps {
  kind?: PressKind | undefined;
  disabled?: boolean | undefined;
  /** what a screen reader says when the visible word is not enough */
  name?: string | undefined;
  /** colour behind the button where that is not the page's paper */
  ground?: string | undefined;
  onPress: () => void;
}

interface Props extends PressProps {
  minHeight?: number | undefined;
  style?: ViewStyle | undefined;
  children: (word: string) => ReactNode;
}

interface WebState {
  pressed: boolean;
  hovered?: boolean;
}

/** A button by role; draws what `children` makes of the colour of its words. */
export function Press({ kind = 'plain', disabled = false, name, ground, onPress, minHeight = target.control, style, children }: Props) {
  const { colors } = useTheme();
  const visual = (state: WebState) => pressVisual(kind, { disabled, pressed: state.pressed, hovered: state.hovered ?? false }, colors);
  return (
    <Pressable
      role="button"
      {...(name ? { 'aria-label': name } : {})}
      disabled={disabled}
      aria-disabled={disabled}
      onPress={onPress}
      style={(state) => {
        const v = visual(state);
        return [
          {
            minHeight,
            minWidth: target.control,
            justifyContent: 'center',
            paddingHorizontal: kind === 'quiet' ? space.s : space.xl,
            paddingVertical: space.s,
            borderWidth: line.rule,
            borderColor: v.border,
            backgroundColor: v.ground,
            borderRadius: 0,
          },
          style,
        ];
      }}
    >
      {(state) => (
        <>
          {kind === 'primary' ? <NotchCorner ground={ground} /> : null}
          <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'center', gap: space.m }}>
            {children(visual(state).word)}
          </View>
        </>
      )}
    </Pressable>
  );
}
