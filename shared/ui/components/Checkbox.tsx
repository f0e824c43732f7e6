/** A thing to tick, with the whole row as its target. */
import { Pressable, View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { line, space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  label: string;
  detail?: string | undefined;
  checked: boolean;
  disabled?: boolean | undefined;
  onChange: (checked: boolean) => void;
}

/** Ticked or not; Space and Enter toggle it. */
export function Checkbox({ label, detail, checked, disabled = false, onChange }: Props) {
  const { colors } = useTheme();
  const ink = disabled ? colors.inkSoft : colors.ink;
  return (
    <Pressable
      role="checkbox"
      aria-checked={checked}
      aria-disabled={disabled}
      aria-label={detail ? `${label}: ${detail}` : label}
      disabled={disabled}
      onPress={() => onChange(!checked)}
      style={{
        minHeight: target.control + 4,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.m,
        paddingVertical: space.s,
        borderBottomWidth: line.hair,
        borderBottomColor: colors.rule,
        alignSelf: 'stretch',
      }}
    >
      <View
        style={{
          width: 28,
          height: 28,
          borderWidth: line.rule,
          borderColor: ink,
          backgroundColor: colors.raised,
          alignItems: 'center',
          justifyContent: 'center',
        }}
      >
        {checked ? <Icon name="check" size={22} color={ink} weight={3} /> : null}
      </View>
      <View style={{ flex: 1 }}>
        <BodyText tone={disabled ? 'soft' : 'ink'}>{label}</BodyText>
        {detail ? (
          <BodyText size="small" tone="soft">
            {detail}
          </BodyText>
        ) : null}
      </View>
    </Pressable>
  );
}
