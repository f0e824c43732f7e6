/** Where a reading is typed: numerals as big as the meter's own. */
import { useId, useRef, useState } from 'react';
import { Pressable, Text, TextInput, View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { FieldError } from '@/shared/ui/components/FieldError';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { Label } from '@/shared/ui/components/Label';
import { line, space, target } from '@/shared/ui/theme/space';
import { face, type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webProps } from '@/shared/ui/theme/webStyle';

interface Props {
  /** what is read, as "+5 V at the supply terminals" */
  label: string;
  /** accessible name where the label alone would not do */
  name?: string | undefined;
  value: string;
  unit: string;
  /** stands behind the label as it is written: capitals would turn milliohms into megohms */
  limit?: string | undefined;
  /** which meter on which range, as "Meter A, 60 V" */
  meter?: string | undefined;
  error?: string | undefined;
  hint?: string | undefined;
  disabled?: boolean | undefined;
  /** takes the focus when it appears, so that figures can be typed at once */
  autoFocus?: boolean | undefined;
  onChangeText: (text: string) => void;
  onSubmit?: (() => void) | undefined;
}

/** Takes `4.97`, `4,97`, `470m`, `4k7`: number keys first, letters and sign one touch away. */
export function ReadingEntry({ label, name, value, unit, limit, meter, error, hint, disabled = false, autoFocus = false, onChangeText, onSubmit }: Props) {
  const { colors } = useTheme();
  const [letters, setLetters] = useState(false);
  const input = useRef<TextInput>(null);
  const id = useId();
  const described = [error ? `${id}e` : null, hint ? `${id}h` : null].filter(Boolean).join(' ');
  return (
    <View style={{ gap: space.xs, alignSelf: 'stretch' }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: space.m, flexWrap: 'wrap' }}>
        <Label>{label}</Label>
        {limit ? <BodyText size="small">{limit}</BodyText> : null}
        {meter ? (
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
            <Icon name="meter" size={22} color={colors.inkSoft} weight={1.6} />
            <BodyText size="small" tone="soft">
              {meter}
            </BodyText>
          </View>
        ) : null}
      </View>
      <View
        {...webProps({ dataSet: { ring: 'within' } })}
        style={{
          flexDirection: 'row',
          alignItems: 'center',
          borderBottomWidth: line.heavy,
          borderBottomColor: error ? colors.brass : colors.ink,
          backgroundColor: colors.raised,
          gap: space.s,
          paddingHorizontal: space.s,
        }}
      >
        <TextInput
          ref={input}
          value={value}
          onChangeText={onChangeText}
          onSubmitEditing={() => onSubmit?.()}
          editable={!disabled}
          autoFocus={autoFocus}
          inputMode={letters ? 'text' : 'decimal'}
          autoCapitalize="none"
          autoCorrect={false}
          spellCheck={false}
          autoComplete="off"
          enterKeyHint="done"
          aria-label={name ?? `${label}, in ${unit}`}
          {...webProps({ 'aria-invalid': error !== undefined, ...(described ? { 'aria-describedby': described } : {}) })}
          style={[type.reading, { flex: 1, minWidth: 0, color: colors.ink, minHeight: target.answer + 8, padding: 0 }]}
        />
        <Text style={{ fontFamily: face.mono, fontSize: 32, lineHeight: 40, color: colors.ink }} aria-hidden>
          {unit}
        </Text>
        <Pressable
          role="button"
          aria-label="Letters and sign"
          aria-pressed={letters}
          disabled={disabled}
          onPress={() => {
            setLetters(!letters);
            input.current?.focus();
          }}
          style={{
            minWidth: target.control,
            minHeight: target.control,
            alignItems: 'center',
            justifyContent: 'center',
            borderLeftWidth: line.hair,
            borderLeftColor: colors.rule,
            paddingHorizontal: space.xs,
          }}
        >
          <Text style={[type.label, { color: colors.action, textTransform: 'none' }]}>{letters ? '123' : '− k m'}</Text>
        </Pressable>
      </View>
      {error ? <FieldError id={`${id}e`} text={error} /> : null}
      {hint ? (
        <BodyText id={`${id}h`} size="small" tone="soft">
          {hint}
        </BodyText>
      ) : null}
    </View>
  );
}
