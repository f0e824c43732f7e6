/** Changing the own password. */
import { zodResolver } from '@hookform/resolvers/zod';
import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';

import { changePasswordBody, PASSWORD_LEAST } from '@/shared/contract/account';
import { client } from '@/shared/ui/api/client';
import { queryKeyOf } from '@/shared/ui/api/queries';
import { Button } from '@/shared/ui/components/Button';
import { FormField } from '@/shared/ui/components/FormField';
import { Notice } from '@/shared/ui/components/Notice';
import { Section } from '@/shared/ui/screens/shell/Section';
import { space } from '@/shared/ui/theme/space';

const nothing = { password: '', next: '' };

/** What the server finds wrong stands at the field that it is about; what was typed stays. */
export function ChangePassword() {
  const queries = useQueryClient();
  const [said, setSaid] = useState<{ done: boolean; say: string } | null>(null);
  const { control, handleSubmit, formState, setError, reset } = useForm({ resolver: zodResolver(changePasswordBody), defaultValues: nothing });
  const submit = handleSubmit(async (body) => {
    setSaid(null);
    const answer = await client.call('changePassword', { body });
    if (answer.kind === 'ok') {
      reset(nothing);
      setSaid({ done: true, say: 'Your password is changed. You stay signed in here; every other session of yours has ended.' });
      await queries.invalidateQueries({ queryKey: queryKeyOf('sessions') });
    } else if (answer.code === 'wrong-password') setError('password', { message: 'This is not your password of now.' }, { shouldFocus: true });
    else if (answer.code === 'weak-password') setError('next', { message: answer.say }, { shouldFocus: true });
    else setSaid({ done: false, say: answer.say });
  });
  return (
    <Section title="Change of password">
      <View style={{ gap: space.l, maxWidth: 520 }}>
        <FormField control={control} name="password" label="Password of now" required secret autoComplete="current-password" />
        <FormField
          control={control}
          name="next"
          label="New password"
          hint={`At least ${PASSWORD_LEAST} characters. Four words that do not belong together are easier to type in gloves than signs and figures.`}
          required
          secret
          onSubmit={() => void submit()}
          autoComplete="new-password"
        />
        <View style={{ alignItems: 'flex-start' }}>
          <Button kind="primary" label={formState.isSubmitting ? 'Changing …' : 'Change the password'} disabled={formState.isSubmitting} onPress={() => void submit()} />
        </View>
      </View>
      {said === null ? null : (
        <Notice kind={said.done ? 'note' : 'look'} live>
          {said.say}
        </Notice>
      )}
    </Section>
  );
}
