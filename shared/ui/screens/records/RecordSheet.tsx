/** The sheet of a record: exceptions and acts at the side, power, readings, people and entries in the middle. */
import { useMemo, useState } from 'react';

import { FIRST_CAUTION } from '@/flows/document/hazards';
import { ENGINE } from '@/flows/machine/compile';
import type { RecordView } from '@/shared/contract/records';
import type { Me } from '@/shared/contract/session';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Notice } from '@/shared/ui/components/Notice';
import { PowerStrip } from '@/shared/ui/components/PowerStrip';
import { Exceptions } from '@/shared/ui/screens/records/Exceptions';
import { exceptionsOf } from '@/shared/ui/screens/records/exceptionsOf';
import { FindingDialog } from '@/shared/ui/screens/records/FindingDialog';
import { Findings } from '@/shared/ui/screens/records/Findings';
import { Outcome } from '@/shared/ui/screens/records/Outcome';
import { People } from '@/shared/ui/screens/records/People';
import { powerSegments } from '@/shared/ui/screens/records/powerSegments';
import { Readings } from '@/shared/ui/screens/records/Readings';
import { readingsOf } from '@/shared/ui/screens/records/readingsOf';
import type { Replay } from '@/shared/ui/screens/records/replayRecord';
import { ReviewActions } from '@/shared/ui/screens/records/ReviewActions';
import { reviewOffers } from '@/shared/ui/screens/records/reviewOffers';
import { Timeline } from '@/shared/ui/screens/records/Timeline';
import { Columns } from '@/shared/ui/screens/shell/Columns';
import { clockWords, dateWords } from '@/shared/ui/screens/shell/dateWords';
import { Section } from '@/shared/ui/screens/shell/Section';

interface Props {
  record: RecordView;
  replay: Replay;
  me: Me;
}

/** All of it is worked out here from the entries; nothing is taken on trust. */
export function RecordSheet({ record, replay, me }: Props) {
  const [remarkOn, setRemarkOn] = useState<string | null>(null);
  const offers = reviewOffers(record, me);
  const readings = useMemo(() => readingsOf(replay.entries), [replay]);
  const exceptions = useMemo(() => exceptionsOf(replay.entries, record.instruments, record.settings), [replay, record]);
  const power = useMemo(() => powerSegments(replay.entries), [replay]);
  return (
    <>
      <Columns
        sideWidth={392}
        side={
          <>
            <Outcome record={record} end={replay.end?.end ?? null} />
            {record.pins.engine === ENGINE ? null : (
              <Notice title="Made under older rules">
                This run was led by an earlier version of the rules. It is played again here by those of today; the entries are as they were
                written.
              </Notice>
            )}
            {replay.broken ? (
              <Notice
                title={`Entry ${replay.broken.seq} cannot be played again`}
              >{`${replay.broken.say} From there on only what the entries state is shown.`}</Notice>
            ) : null}
            <Section title="Look at these first" look="label">
              <Exceptions exceptions={exceptions} />
            </Section>
            <Findings record={record} />
            <ReviewActions record={record} offers={offers} />
            <Notice kind="note">
              <BodyText size="small">{FIRST_CAUTION}</BodyText>
            </Notice>
          </>
        }
      >
        {power.from !== null && power.to !== null ? (
          <Section
            title={`Power at the bench, ${dateWords(power.from)}, ${clockWords(power.from)} to ${clockWords(power.to)}`}
            look="label"
          >
            <PowerStrip title={`Power at the bench, ${clockWords(power.from)} to ${clockWords(power.to)}`} segments={power.segments} />
          </Section>
        ) : null}
        <Readings lines={readings} />
        <People record={record} replay={replay} readings={readings} />
        <Timeline record={record} replay={replay} readings={readings} onRemark={offers.find ? setRemarkOn : null} />
      </Columns>
      {remarkOn === null ? null : <FindingDialog record={record} entry={remarkOn} onClose={() => setRemarkOn(null)} />}
    </>
  );
}
