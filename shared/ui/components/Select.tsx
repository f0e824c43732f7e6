/** One of many, from a list that the device shows in its own way. */
import { useId } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { FieldError } from '@/shared/ui/components/FieldError';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { Label } from '@/shared/ui/components/Label';
import { line, space, target } from '@/shared/ui/theme/space';
import { face } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

export interface Option {
  value: string;
  label: string;
}

interface Props {
  label: string;
  /** what it belongs to where several have the same label; a reader says it before the label */
  within?: string | undefined;
  options: readonly Option[];
  /** null while nothing is chosen */
  value: string | null;
  onChange: (value: string) => void;
  error?: string | undefined;
  hint?: string | undefined;
  disabled?: boolean | undefined;
}

/** The browser's own list, which phones, keyboards and screen readers all know; for up to five use `Choice`. */
export function Select({ label, within, options, value, onChange, error, hint, disabled = false }: Props) {
  const { colors } = useTheme();
  const id = useId();
  return (
    <View style={{ gap: space.xs, alignSelf: 'stretch' }}>
      <Label>{label}</Label>
      <View>
        <select
          aria-label={within === undefined ? label : `${within}, ${label}`}
          aria-invalid={error !== undefined}
          {...(error || hint ? { 'aria-describedby': [error ? `${id}e` : null, hint ? `${id}h` : null].filter(Boolean).join(' ') } : {})}
          disabled={disabled}
          value={value ?? ''}
          onChange={(e) => onChange(e.target.value)}
          style={{
            appearance: 'none',
            boxSizing: 'border-box',
            width: '100%',
            minHeight: target.control + 4,
            padding: `0 ${space.huge}px 0 ${space.m}px`,
            border: `${line.rule}px solid ${error ? colors.brass : colors.ink}`,
            borderRadius: 0,
            background: colors.raised,
            color: colors.ink,
            fontFamily: face.text,
            fontSize: 18,
          }}
        >
          {value === null ? <option value="">Choose …</option> : null}
          {options.map((o) => (
            <option key={o.value} value={o.value}>
              {o.label}
            </option>
          ))}
        </select>
        <View style={{ position: 'absolute', right: space.m, top: 0, bottom: 0, justifyContent: 'center', pointerEvents: 'none' }}>
          <Icon name="unfold" size={20} color={colors.ink} />
        </View>
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
