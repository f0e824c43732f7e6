/** Head, instruction, figure and notes of a step; from the second row on the instruction makes room for the rows. */
import { useState } from 'react';
import { View } from 'react-native';

import type { Row } from '@/flows/machine/rows';
import type { ReadingNow } from '@/flows/machine/stepWorkings';
import { Button } from '@/shared/ui/components/Button';
import type { Run } from '@/shared/ui/screens/run/Run';
import { StepAside } from '@/shared/ui/screens/run/StepAside';
import { StepFigure } from '@/shared/ui/screens/run/StepFigure';
import { StepHead } from '@/shared/ui/screens/run/StepHead';
import { StepLines } from '@/shared/ui/screens/run/StepLines';
import { StepNotes } from '@/shared/ui/screens/run/StepNotes';

/** `row` is the one to be answered now, or null; `now` the reading that is being taken there. */
export function StepBody({ run, row, now = null }: { run: Run; row: Row | null; now?: ReadingNow | null }) {
  const { step, rows } = run.view;
  const begun = rows.some((r) => r.answer !== null);
  const [shown, setShown] = useState(false);
  return (
    <>
      <StepHead run={run} />
      {step !== null && (!begun || shown) ? (
        <>
          <StepLines step={step} aside={<StepAside run={run} />} />
          <StepNotes run={run} now={now} />
        </>
      ) : null}
      {step !== null && begun && !shown ? (
        <View style={{ flexDirection: 'row' }}>
          <Button kind="quiet" label="Show the instruction again" onPress={() => setShown(true)} />
        </View>
      ) : null}
      <StepFigure run={run} row={row} />
    </>
  );
}
