/** What the person who reads a record can do with it. */
import { useState } from 'react';
import { View } from 'react-native';

import type { RecordView } from '@/shared/contract/records';
import { useReview } from '@/shared/ui/api/useReview';
import { AcceptDialog } from '@/shared/ui/screens/records/AcceptDialog';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Notice } from '@/shared/ui/components/Notice';
import { ReplyDialog } from '@/shared/ui/screens/records/ReplyDialog';
import { ReturnDialog } from '@/shared/ui/screens/records/ReturnDialog';
import type { ReviewOffers } from '@/shared/ui/screens/records/reviewOffers';
import { saveFile } from '@/shared/ui/screens/records/saveFile';
import { SubmitDialog } from '@/shared/ui/screens/records/SubmitDialog';
import { Section } from '@/shared/ui/screens/shell/Section';
import { space } from '@/shared/ui/theme/space';

interface Props {
  record: RecordView;
  offers: ReviewOffers;
}

/** Buttons for what may be done, a sentence for what may not. */
export function ReviewActions({ record, offers }: Props) {
  const [open, setOpen] = useState<'accept' | 'return' | 'reply' | 'submit' | null>(null);
  const close = () => setOpen(null);
  return (
    <Section title="Review" look="label">
      {offers.find ? (
        <BodyText size="small" tone="soft">
          A finding is made at its entry, below.
        </BodyText>
      ) : null}
      {offers.why.map((why) => (
        <Notice key={why} kind="note">
          {why}
        </Notice>
      ))}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s }}>
        {offers.return ? <Button label="Return" onPress={() => setOpen('return')} /> : null}
        {offers.accept ? <Button kind="primary" label="Accept and sign" onPress={() => setOpen('accept')} /> : null}
        {offers.reply ? <Button kind="primary" label="Answer and submit again" onPress={() => setOpen('reply')} /> : null}
        {offers.submit ? <Button kind="primary" label="Submit for review" onPress={() => setOpen('submit')} /> : null}
        <ExportButton record={record} />
      </View>
      {open === 'accept' ? <AcceptDialog record={record} release={offers.release} onClose={close} /> : null}
      {open === 'return' ? <ReturnDialog record={record} onClose={close} /> : null}
      {open === 'reply' ? <ReplyDialog record={record} onClose={close} /> : null}
      {open === 'submit' ? <SubmitDialog record={record} onClose={close} /> : null}
    </Section>
  );
}

function ExportButton({ record }: { record: RecordView }) {
  const { exportFile } = useReview(record.run.id);
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const save = async () => {
    setBusy(true);
    const answer = await exportFile();
    setBusy(false);
    setProblem(answer.kind === 'ok' ? null : answer.say);
    if (answer.kind === 'ok') saveFile(`record-${record.run.machine.serial}-${record.run.id}.json`, `${JSON.stringify(answer.data)}\n`);
  };
  return (
    <>
      <Button icon="down" label="Signed file" name="Save the record as a signed file" disabled={busy} onPress={() => void save()} />
      {problem ? <Notice live>{problem}</Notice> : null}
    </>
  );
}
