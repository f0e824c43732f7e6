/** Accepting a record: a signature with its meaning in words. */
import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm } from 'react-hook-form';
import { z } from 'zod';

import { acceptBody } from '@/shared/contract/records';
import type { RecordView } from '@/shared/contract/records';
import { useReview } from '@/shared/ui/api/useReview';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Checkbox } from '@/shared/ui/components/Checkbox';
import { FormField } from '@/shared/ui/components/FormField';
import { Notice } from '@/shared/ui/components/Notice';
import { ActDialog } from '@/shared/ui/screens/records/ActDialog';
import { useAct } from '@/shared/ui/screens/records/useAct';

const formSchema = z.object({ ...acceptBody.pick({ password: true, meaning: true }).shape, release: z.boolean() });

/** What a signature means unless the reviewer says it in other words. */
export const SIGNATURE_MEANING =
  'I took no part in this run. I have read its record from the first entry to the last, and its outcome follows from what stands in it.';

interface Props {
  record: RecordView;
  /** a release can go with it */
  release: boolean;
  onClose: () => void;
}

/** The password is asked again, since this signs. */
export function AcceptDialog({ record, release, onClose }: Props) {
  const { accept } = useReview(record.run.id);
  const { id, problem, send } = useAct(onClose);
  const { control, handleSubmit, formState, setError } = useForm({
    resolver: zodResolver(formSchema),
    defaultValues: { password: '', meaning: SIGNATURE_MEANING, release: false },
  });
  const act = handleSubmit(async (given) => {
    const refused = await send(() => accept({ id, ...given }));
    if (refused?.code === 'wrong-password') setError('password', { message: refused.say });
  });
  const { machine } = record.run;
  return (
    <ActDialog
      title="Accept and sign"
      act="Accept and sign"
      busy={formState.isSubmitting}
      problem={problem?.code === 'wrong-password' ? null : problem}
      onAct={() => void act()}
      onClose={onClose}
    >
      <BodyText>{`Record of ${machine.name}, serial ${machine.serial}, ${record.head.seq} entries. Afterwards nothing in it can be changed.`}</BodyText>
      <FormField
        control={control}
        name="meaning"
        label="Your signature means"
        required
        lines={4}
        hint="It is written into the record under your name, with the time."
      />
      {release ? (
        <Controller
          control={control}
          name="release"
          render={({ field }) => (
            <Checkbox
              label="Release: supply proven, may be refitted"
              detail={`for serial ${machine.serial}; void after any later work on that supply`}
              checked={field.value}
              onChange={field.onChange}
            />
          )}
        />
      ) : (
        <Notice kind="note">No release goes with it: that rests only on a run that ended with the supply proven.</Notice>
      )}
      <FormField
        control={control}
        name="password"
        label="Your password"
        required
        secret
        onSubmit={() => void act()}
        autoComplete="current-password"
      />
    </ActDialog>
  );
}
