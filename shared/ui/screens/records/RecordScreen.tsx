/** One record on one page. */
import type { RecordView } from '@/shared/contract/records';
import { useMe, useRecord } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Page } from '@/shared/ui/components/Page';
import { ChainVerdict } from '@/shared/ui/screens/records/ChainVerdict';
import { RecordSheet } from '@/shared/ui/screens/records/RecordSheet';
import { useReplay } from '@/shared/ui/screens/records/useReplay';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { endingWords } from '@/shared/ui/screens/shell/runWords';

/** Outcome first, then what to look at, then the whole story. */
export function RecordScreen({ recordId }: { recordId: string }) {
  const record = useRecord(recordId);
  const me = useMe();
  const replay = useReplay(record.data);
  const shown = record.data;
  return (
    <Page
      title={shown ? outcome(shown, replay?.end?.end?.title) : 'Record'}
      eyebrow={shown ? belongsTo(shown) : undefined}
      aside={shown ? <ChainVerdict record={shown} /> : null}
      maxWidth={1440}
    >
      <Fetched query={record} what="the record">
        {(data) =>
          me.data && replay ? (
            <RecordSheet record={data} replay={replay} me={me.data} />
          ) : (
            <BodyText tone="soft">Reading the entries …</BodyText>
          )
        }
      </Fetched>
    </Page>
  );
}

function outcome({ run }: RecordView, endTitle: string | undefined): string {
  const words = endingWords(run.ended);
  const said = `${words[0]?.toUpperCase() ?? ''}${words.slice(1)}`;
  // an end that only repeats the word for it adds nothing
  return endTitle && !words.includes(endTitle.toLowerCase()) ? `${said}: ${endTitle}` : said;
}

function belongsTo({ run, pins }: RecordView): string {
  return `Record · ${run.machine.name}, serial ${run.machine.serial} · ${run.tree.title}, version ${run.tree.version} · profile revision ${pins.profileRevision}`;
}
