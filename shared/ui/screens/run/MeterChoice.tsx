/** Which meter is in the hand: its sticker, and another one to choose. */
import { useState } from 'react';

import type { ReadingRow } from '@/flows/machine/rows';
import type { Instrument } from '@/shared/contract/instruments';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Choice } from '@/shared/ui/components/Choice';
import { Dialog } from '@/shared/ui/components/Dialog';
import { Notice } from '@/shared/ui/components/Notice';
import { StopBar } from '@/shared/ui/components/StopBar';
import type { Run } from '@/shared/ui/screens/run/Run';
import type { MeterInUse } from '@/shared/ui/screens/run/useMeter';
import { functionsOf } from '@/shared/ui/screens/workshop/instrumentWords';

interface Props {
  run: Run;
  row: ReadingRow;
  meter: MeterInUse;
  words: string | null;
}

/** Instruments that cannot be used here are named with the reason. */
export function MeterChoice({ run, row, meter, words }: Props) {
  const [open, setOpen] = useState(false);
  const usable = meter.meters.filter((m) => m.barred === null);
  const barred = meter.meters.filter((m) => m.barred !== null);
  const close = () => setOpen(false);
  return (
    <>
      {words === null ? (
        <Notice>{`No instrument of this workshop can be used for this reading. ${barred.map((m) => `${m.instrument.tag}: ${m.barred ?? ''}`).join('; ')}`}</Notice>
      ) : null}
      <Button
        kind="quiet"
        icon="meter"
        label={words ?? 'Instruments'}
        name={words === null ? 'Instruments' : `Meter: ${words}. Choose another`}
        onPress={() => setOpen(true)}
      />
      {open ? (
        <Dialog
          title="Which instrument?"
          onClose={close}
          actions={<Button kind="primary" label="Back to the reading" onPress={close} />}
          foot={<StopBar onPress={() => void run.send({ type: 'STOP' })} />}
        >
          {usable.length > 0 ? (
            <Choice
              label="Instrument"
              value={meter.chosen?.id ?? null}
              options={usable.map(({ instrument: i }) => ({ value: i.id, label: `${i.tag}, ${i.name}`, detail: accuracyOf(i, row) }))}
              onChange={(id) => {
                const found = usable.find((m) => m.instrument.id === id);
                if (found) meter.choose(found.instrument);
              }}
            />
          ) : null}
          {barred.map(({ instrument: i, barred: why }) => (
            <BodyText key={i.id} tone="soft">{`${i.tag}, ${i.name}: ${why ?? ''}`}</BodyText>
          ))}
        </Dialog>
      ) : null}
    </>
  );
}

function accuracyOf(instrument: Instrument, row: ReadingRow): string {
  const functions = functionsOf(instrument.ranges.filter((r) => r.quantity === row.quantity));
  return functions.map((f) => `${f.ranges}: ${f.accuracy}`).join('; ');
}
