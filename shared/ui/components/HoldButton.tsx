/** A button that must be held: for putting power in. */
import { useRef } from 'react';
import { Text, View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { holdWords } from '@/shared/ui/components/holdReducer';
import { NotchCorner } from '@/shared/ui/components/NotchCorner';
import { useHold } from '@/shared/ui/components/useHold';
import { useReducedMotion } from '@/shared/ui/components/useReducedMotion';
import { line, space, target } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webProps, webStyle } from '@/shared/ui/theme/webStyle';

interface Props {
  label: string;
  /** how long it must be held, in milliseconds */
  holdMs?: number | undefined;
  disabled?: boolean | undefined;
  /** called once; give the button a new `key` to ask again */
  onConfirm: () => void;
}

interface KeyLike {
  key: string;
  repeat: boolean;
  preventDefault: () => void;
}

const holdKeys = [' ', 'Enter'];

/** Hold with a pointer, Space or Enter; letting go early does nothing and says so. */
export function HoldButton({ label, holdMs = 2000, disabled = false, onConfirm }: Props) {
  const { colors } = useTheme();
  const still = useReducedMotion();
  const { phase, share, send } = useHold(holdMs, onConfirm);
  const pressed = useRef(false);
  const over = disabled || phase === 'confirmed';
  const down = () => {
    if (over) return;
    pressed.current = true;
    send('down');
  };
  const up = () => send('up');
  const handlers = webProps({
    onPointerDown: (e: { button: number }) => (e.button === 0 ? down() : undefined),
    onPointerUp: up,
    onPointerLeave: up,
    onPointerCancel: up,
    onBlur: up,
    onContextMenu: (e: { preventDefault: () => void }) => e.preventDefault(),
    onKeyDown: (e: KeyLike) => {
      if (!holdKeys.includes(e.key)) return;
      e.preventDefault();
      if (!e.repeat) down();
    },
    onKeyUp: (e: KeyLike) => {
      if (!holdKeys.includes(e.key)) return;
      e.preventDefault();
      up();
    },
    onClick: () => {
      // a pointer's own click follows its press; one that follows none comes from assistive technology
      if (!pressed.current && !over) send('bare-click');
      pressed.current = false;
    },
  });
  // with reduced motion the bar moves in four steps instead of sliding
  const drawn = still ? Math.floor(share * 4) / 4 : share;
  return (
    <View style={{ gap: space.s, alignSelf: 'stretch' }}>
      <View
        role="button"
        tabIndex={disabled ? -1 : 0}
        aria-disabled={over}
        {...handlers}
        style={[
          {
            minHeight: target.answer + 8,
            borderWidth: line.heavy,
            borderColor: over ? colors.disabled : colors.ink,
            backgroundColor: over ? colors.disabled : colors.raised,
            justifyContent: 'center',
            paddingHorizontal: space.xl,
          },
          webStyle({ touchAction: 'none', userSelect: 'none', cursor: over ? 'default' : 'pointer' }),
        ]}
      >
        <View style={{ position: 'absolute', left: 0, bottom: 0, height: 10, width: `${drawn * 100}%`, backgroundColor: colors.ink }} />
        <View
          style={{
            position: 'absolute',
            left: 0,
            right: 0,
            bottom: 10,
            height: line.hair,
            backgroundColor: over ? colors.onDisabled : colors.ink,
          }}
        />
        <NotchCorner edge={over ? undefined : colors.ink} border={line.heavy} />
        <Text style={[type.answer, { color: over ? colors.onDisabled : colors.ink, textAlign: 'center', paddingBottom: 8 }]}>{label}</Text>
      </View>
      <View role="status" aria-live="polite">
        <BodyText size="small" tone="soft" align="center">
          {disabled ? 'Not open yet.' : holdWords(phase, holdMs)}
        </BodyText>
      </View>
    </View>
  );
}
