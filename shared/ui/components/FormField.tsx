/** A labelled text of a form, bound to it by its name. */
import { Controller } from 'react-hook-form';
import type { Control, FieldPath, FieldValues } from 'react-hook-form';

import { Field } from '@/shared/ui/components/Field';
import type { FieldProps } from '@/shared/ui/components/Field';

interface Props<Form extends FieldValues, Result> extends Omit<FieldProps, 'value' | 'onChangeText' | 'onBlur' | 'error'> {
  /** of the form's `useForm`; its resolved values may have another shape than what is typed */
  control: Control<Form, unknown, Result>;
  name: FieldPath<Form>;
}

/** What is wrong with it stands below it, in the words of the form's schema. */
export function FormField<Form extends FieldValues, Result>({ control, name, ...look }: Props<Form, Result>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <Field {...look} value={field.value} onChangeText={field.onChange} onBlur={field.onBlur} error={fieldState.error?.message} />
      )}
    />
  );
}
