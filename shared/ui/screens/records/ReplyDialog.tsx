/** The restorer's answer to a returned record. */
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';

import { replyBody } from '@/shared/contract/records';
import type { RecordView } from '@/shared/contract/records';
import { useReview } from '@/shared/ui/api/useReview';
import { BodyText } from '@/shared/ui/components/BodyText';
import { FormField } from '@/shared/ui/components/FormField';
import { ActDialog } from '@/shared/ui/screens/records/ActDialog';
import { useAct } from '@/shared/ui/screens/records/useAct';

const formSchema = replyBody.pick({ text: true });

interface Props {
  record: RecordView;
  onClose: () => void;
}

/** The questions stand above the field. */
export function ReplyDialog({ record, onClose }: Props) {
  const { reply } = useReview(record.run.id);
  const { id, problem, send } = useAct(onClose);
  const { control, handleSubmit, formState } = useForm({ resolver: zodResolver(formSchema), defaultValues: { text: '' } });
  const act = handleSubmit(async ({ text }) => {
    await send(() => reply({ id, text }));
  });
  const asked = [...record.entries].reverse().find((e) => e.kind === 'returned')?.body['questions'];
  return (
    <ActDialog
      title="Answer and submit again"
      act="Submit again"
      busy={formState.isSubmitting}
      problem={problem}
      onAct={() => void act()}
      onClose={onClose}
    >
      <View>{Array.isArray(asked) ? asked.map((q, i) => <BodyText key={String(q)}>{`${i + 1}. ${String(q)}`}</BodyText>) : null}</View>
      <FormField control={control} name="text" label="Your answer" required lines={5} />
    </ActDialog>
  );
}
