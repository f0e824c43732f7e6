/** A finding on one entry. */
import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm } from 'react-hook-form';
import type { z } from 'zod';

import { findingBody } from '@/shared/contract/records';
import type { RecordView } from '@/shared/contract/records';
import { useReview } from '@/shared/ui/api/useReview';
import { Choice } from '@/shared/ui/components/Choice';
import { FormField } from '@/shared/ui/components/FormField';
import { ActDialog } from '@/shared/ui/screens/records/ActDialog';
import { useAct } from '@/shared/ui/screens/records/useAct';

const formSchema = findingBody.pick({ grade: true, text: true });
type Given = z.input<typeof formSchema>;

const grades = [
  { value: 'note', label: 'Note', detail: 'worth saying, changes nothing' },
  { value: 'minor', label: 'Minor', detail: 'not as it should be, the outcome stands' },
  { value: 'major', label: 'Major', detail: 'the outcome cannot be relied on as it is' },
];

interface Props {
  record: RecordView;
  /** the entry that it is about */
  entry: string;
  onClose: () => void;
}

/** Grade and words; the entry itself stays as it is. */
export function FindingDialog({ record, entry, onClose }: Props) {
  const { addFinding } = useReview(record.run.id);
  const { id, problem, send } = useAct(onClose);
  const { control, handleSubmit, formState } = useForm<Given>({
    resolver: zodResolver(formSchema),
    defaultValues: { grade: 'note', text: '' },
  });
  const act = handleSubmit(async ({ grade, text }) => {
    await send(() => addFinding({ id, entry, grade, text }));
  });
  const seq = record.entries.find((e) => e.id === entry)?.seq ?? 0;
  return (
    <ActDialog
      title={`Finding on entry ${seq}`}
      act="Write it down"
      busy={formState.isSubmitting}
      problem={problem}
      onAct={() => void act()}
      onClose={onClose}
    >
      <Controller
        control={control}
        name="grade"
        render={({ field }) => <Choice label="Grade" options={grades} value={field.value} onChange={field.onChange} />}
      />
      <FormField control={control} name="text" label="What you found" required lines={4} />
    </ActDialog>
  );
}
