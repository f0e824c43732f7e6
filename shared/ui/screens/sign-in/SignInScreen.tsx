/** The door of the workshop. */
import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'expo-router';
import type { Href } from 'expo-router';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';

import { FIRST_CAUTION } from '@/flows/document/hazards';
import { signInBody } from '@/shared/contract/session';
import { useSession } from '@/shared/ui/api/useSession';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { FormField } from '@/shared/ui/components/FormField';
import { Notice } from '@/shared/ui/components/Notice';
import { Page } from '@/shared/ui/components/Page';
import { returnPath } from '@/shared/ui/screens/sign-in/returnPath';
import { signInProblem } from '@/shared/ui/screens/sign-in/signInProblem';
import type { SignInProblem } from '@/shared/ui/screens/sign-in/signInProblem';
import { space } from '@/shared/ui/theme/space';

const formSchema = signInBody.pick({ mail: true, password: true });

interface Props {
  /** where the person was when the session ran out */
  from: string | string[] | undefined;
  /** set by the guard of the signed-in pages */
  expired: boolean;
}

/** Mail address and password; afterwards back to where one was. */
export function SignInScreen({ from, expired }: Props) {
  const router = useRouter();
  const { signIn } = useSession();
  const [problem, setProblem] = useState<SignInProblem | null>(null);
  const { control, handleSubmit, formState, setFocus } = useForm({
    resolver: zodResolver(formSchema),
    defaultValues: { mail: '', password: '' },
  });
  const submit = handleSubmit(async ({ mail, password }) => {
    setProblem(null);
    const answer = await signIn({ mail, password });
    if (answer.kind === 'ok') {
      router.replace(returnPath(from) as Href);
      return;
    }
    setProblem(signInProblem(answer));
    if (answer.code === 'sign-in-failed') setFocus('password');
  });
  return (
    <Page maxWidth={520} title="Lampstep" eyebrow="Sign in">
      <BodyText size="instruction">
        Leads a restorer, one safe step at a time, through bringing long-dormant electronics back to power.
      </BodyText>
      {expired && problem === null ? (
        <Notice live>
          Your session has run out. Sign in again, and you come back to where you were. Nothing that you entered is lost.
        </Notice>
      ) : null}
      {problem ? (
        <Notice title={problem.happened} live>
          {problem.todo}
        </Notice>
      ) : null}
      <View style={{ gap: space.l }}>
        <FormField
          control={control}
          name="mail"
          label="Mail address"
          required
          onSubmit={() => void submit()}
          inputMode="email"
          autoComplete="username"
        />
        <FormField
          control={control}
          name="password"
          label="Password"
          required
          secret
          onSubmit={() => void submit()}
          autoComplete="current-password"
        />
        <BigAnswer
          kind="primary"
          label={formState.isSubmitting ? 'Signing in …' : 'Sign in'}
          disabled={formState.isSubmitting}
          onPress={() => void submit()}
        />
      </View>
      <Notice kind="note">{FIRST_CAUTION}</Notice>
    </Page>
  );
}
