/** Handing a closed run in for review. */
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';

import type { RecordView } from '@/shared/contract/records';
import { useReview } from '@/shared/ui/api/useReview';
import { BodyText } from '@/shared/ui/components/BodyText';
import { FormField } from '@/shared/ui/components/FormField';
import { ActDialog } from '@/shared/ui/screens/records/ActDialog';
import { useAct } from '@/shared/ui/screens/records/useAct';

const MOST = 1000;
const formSchema = z.object({ remark: z.string().trim().max(MOST, `at most ${MOST} characters`) });

interface Props {
  record: RecordView;
  onClose: () => void;
}

/** With a remark where there is something to say. */
export function SubmitDialog({ record, onClose }: Props) {
  const { submit } = useReview(record.run.id);
  const { id, problem, send } = useAct(onClose);
  const { control, handleSubmit, formState } = useForm({ resolver: zodResolver(formSchema), defaultValues: { remark: '' } });
  const act = handleSubmit(async ({ remark }) => {
    await send(() => submit(remark === '' ? { id } : { id, remark }));
  });
  return (
    <ActDialog
      title="Submit for review"
      act="Submit"
      busy={formState.isSubmitting}
      problem={problem}
      onAct={() => void act()}
      onClose={onClose}
    >
      <BodyText>A reviewer who took no part in the run reads it, and accepts it or returns it with questions.</BodyText>
      <FormField control={control} name="remark" label="Remark" lines={3} />
    </ActDialog>
  );
}
