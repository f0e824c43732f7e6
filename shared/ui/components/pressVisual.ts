/** Which colours a thing that can be pressed has in each of its states. */
import type { Palette } from '@/shared/ui/theme/palette';

export type PressKind = 'primary' | 'plain' | 'quiet';

export interface PressState {
  disabled: boolean;
  pressed: boolean;
  hovered: boolean;
}

export interface PressVisual {
  ground: string;
  word: string;
  border: string;
}

/** Colours for a button of a kind in a state. A disabled one keeps its words readable. */
export function pressVisual(kind: PressKind, state: PressState, colors: Palette): PressVisual {
  if (state.disabled) {
    const border = kind === 'quiet' ? 'transparent' : colors.disabled;
    return {
      ground: kind === 'primary' ? colors.disabled : 'transparent',
      word: kind === 'primary' ? colors.onDisabled : colors.inkSoft,
      border,
    };
  }
  const active = state.pressed || state.hovered;
  if (kind === 'primary') {
    const ground = active ? colors.actionPressed : colors.action;
    return { ground, word: colors.onAction, border: ground };
  }
  if (kind === 'plain') {
    return state.pressed
      ? { ground: colors.ink, word: colors.paper, border: colors.ink }
      : { ground: state.hovered ? colors.tint : colors.raised, word: colors.ink, border: colors.ink };
  }
  return { ground: active ? colors.tint : 'transparent', word: colors.action, border: 'transparent' };
}
