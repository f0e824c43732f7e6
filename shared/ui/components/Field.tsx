/** A labelled line or block of text to fill in. */
import { useId } from 'react';
import type { TextInputProps } from 'react-native';
import { View } from 'react-native';
import { TextInput } from 'react-native-paper';

import { BodyText } from '@/shared/ui/components/BodyText';
import { FieldError } from '@/shared/ui/components/FieldError';
import { Label } from '@/shared/ui/components/Label';
import { line, space, target } from '@/shared/ui/theme/space';
import { face } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webProps } from '@/shared/ui/theme/webStyle';

export interface FieldProps {
  label: string;
  /** what it belongs to where several have the same label; a reader says it before the label */
  within?: string | undefined;
  value: string;
  onChangeText: (text: string) => void;
  onBlur?: (() => void) | undefined;
  onSubmit?: (() => void) | undefined;
  error?: string | undefined;
  hint?: string | undefined;
  required?: boolean | undefined;
  disabled?: boolean | undefined;
  secret?: boolean | undefined;
  /** more than one line */
  lines?: number | undefined;
  inputMode?: TextInputProps['inputMode'] | undefined;
  autoComplete?: TextInputProps['autoComplete'] | undefined;
}

/** The name stays above the field, the fault below it; both belong to it for a screen reader. */
export function Field({
  label,
  within,
  value,
  onChangeText,
  onBlur,
  onSubmit,
  error,
  hint,
  required = false,
  disabled = false,
  secret = false,
  lines = 1,
  inputMode,
  autoComplete,
}: FieldProps) {
  const { colors } = useTheme();
  const id = useId();
  const described = [error ? `${id}e` : null, hint ? `${id}h` : null].filter(Boolean).join(' ');
  return (
    <View style={{ gap: space.xs, alignSelf: 'stretch' }}>
      <Label>{required ? label : `${label} (may stay empty)`}</Label>
      <View {...webProps({ dataSet: { ring: 'within' } })}>
        <TextInput
          mode="outlined"
          value={value}
          onChangeText={onChangeText}
          onBlur={() => onBlur?.()}
          onSubmitEditing={() => onSubmit?.()}
          disabled={disabled}
          secureTextEntry={secret}
          multiline={lines > 1}
          numberOfLines={lines}
          error={error !== undefined}
          {...(inputMode ? { inputMode } : {})}
          {...(autoComplete ? { autoComplete } : {})}
          autoCapitalize={secret || inputMode === 'email' ? 'none' : 'sentences'}
          accessibilityLabel={within === undefined ? label : `${within}, ${label}`}
          outlineColor={colors.ink}
          activeOutlineColor={colors.action}
          textColor={colors.ink}
          outlineStyle={{ borderRadius: 0, borderWidth: line.rule }}
          contentStyle={{ fontFamily: face.text, fontSize: 18, paddingHorizontal: space.m, ...(lines > 1 ? { paddingTop: space.m } : {}) }}
          style={{
            minHeight: target.control + 4,
            backgroundColor: colors.raised,
            ...(lines > 1 ? { height: 26 * lines + 28 } : { height: target.control + 4 }),
          }}
          {...webProps({
            'aria-invalid': error !== undefined,
            'aria-required': required,
            ...(described ? { 'aria-describedby': described } : {}),
          })}
        />
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
