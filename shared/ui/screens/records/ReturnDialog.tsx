/** Sending a record back with questions. */
import { zodResolver } from '@hookform/resolvers/zod';
import { useFieldArray, useForm } from 'react-hook-form';
import { z } from 'zod';

import { sentence } from '@/shared/contract/ids';
import type { RecordView } from '@/shared/contract/records';
import { useReview } from '@/shared/ui/api/useReview';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { FormField } from '@/shared/ui/components/FormField';
import { ActDialog } from '@/shared/ui/screens/records/ActDialog';
import { useAct } from '@/shared/ui/screens/records/useAct';

const MOST = 20;
const formSchema = z.object({
  questions: z
    .array(z.object({ text: sentence(500) }))
    .min(1)
    .max(MOST),
});

interface Props {
  record: RecordView;
  onClose: () => void;
}

/** One field a question, so that each can be answered by itself. */
export function ReturnDialog({ record, onClose }: Props) {
  const { returnRecord } = useReview(record.run.id);
  const { id, problem, send } = useAct(onClose);
  const { control, handleSubmit, formState } = useForm({ resolver: zodResolver(formSchema), defaultValues: { questions: [{ text: '' }] } });
  const { fields, append, remove } = useFieldArray({ control, name: 'questions' });
  const act = handleSubmit(async ({ questions }) => {
    await send(() => returnRecord({ id, questions: questions.map((q) => q.text) }));
  });
  return (
    <ActDialog
      title="Return with questions"
      act="Return it"
      busy={formState.isSubmitting}
      problem={problem}
      onAct={() => void act()}
      onClose={onClose}
    >
      <BodyText>The restorer answers, and the record is under review again. Nothing that stands in it is changed.</BodyText>
      {fields.map((row, at) => (
        <FormField key={row.id} control={control} name={`questions.${at}.text`} label={`Question ${at + 1}`} required lines={2} />
      ))}
      {fields.length < MOST ? <Button kind="quiet" icon="plus" label="Another question" onPress={() => append({ text: '' })} /> : null}
      {fields.length > 1 ? (
        <Button kind="quiet" label={`Take out question ${fields.length}`} onPress={() => remove(fields.length - 1)} />
      ) : null}
    </ActDialog>
  );
}
