/** One of a few, all in sight. */
import { useRef } from 'react';
import { Pressable, View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { choiceKey } from '@/shared/ui/components/choiceKeys';
import { Label } from '@/shared/ui/components/Label';
import type { Option } from '@/shared/ui/components/Select';
import { line, space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webProps } from '@/shared/ui/theme/webStyle';

interface Props {
  label: string;
  options: readonly (Option & { detail?: string })[];
  value: string | null;
  onChange: (value: string) => void;
}

/** A list of radios in ruled rows; arrow keys move the choice. */
export function Choice({ label, options, value, onChange }: Props) {
  const { colors } = useTheme();
  const rows = useRef<(View | null)[]>([]);
  const at = options.findIndex((o) => o.value === value);
  return (
    <View style={{ gap: space.xs, alignSelf: 'stretch' }}>
      <View aria-hidden>
        <Label>{label}</Label>
      </View>
      <View
        role="radiogroup"
        aria-label={label}
        style={{ borderWidth: line.rule, borderColor: colors.ink, backgroundColor: colors.raised }}
      >
        {options.map((option, index) => {
          const chosen = index === at;
          return (
            <Pressable
              key={option.value}
              ref={(row) => {
                rows.current[index] = row;
              }}
              role="radio"
              aria-checked={chosen}
              tabIndex={chosen || (at < 0 && index === 0) ? 0 : -1}
              onPress={() => onChange(option.value)}
              {...webProps({
                onKeyDown: (e: { key: string; preventDefault: () => void }) => {
                  const next = choiceKey(e.key, index, options.length);
                  const to = next === null ? undefined : options[next];
                  if (next === null || !to) return;
                  e.preventDefault();
                  onChange(to.value);
                  rows.current[next]?.focus();
                },
                dataSet: { ring: 'inside' },
              })}
              style={{
                minHeight: target.control + 4,
                flexDirection: 'row',
                alignItems: 'center',
                gap: space.m,
                paddingHorizontal: space.m,
                paddingVertical: space.s,
                backgroundColor: chosen ? colors.tint : 'transparent',
                borderTopWidth: index === 0 ? 0 : line.hair,
                borderTopColor: colors.rule,
              }}
            >
              <View
                style={{
                  width: 24,
                  height: 24,
                  borderRadius: 12,
                  borderWidth: line.rule,
                  borderColor: colors.ink,
                  alignItems: 'center',
                  justifyContent: 'center',
                }}
              >
                {chosen ? <View style={{ width: 12, height: 12, borderRadius: 6, backgroundColor: colors.ink }} /> : null}
              </View>
              <View style={{ flex: 1 }}>
                <BodyText bold={chosen}>{option.label}</BodyText>
                {option.detail ? (
                  <BodyText size="small" tone="soft">
                    {option.detail}
                  </BodyText>
                ) : null}
              </View>
            </Pressable>
          );
        })}
      </View>
    </View>
  );
}
