/** A row that is answered by an instrument: typed, understood, drawn on its scale and named before it is sent. */
import { useState } from 'react';
import { View } from 'react-native';

import type { ReadingRow } from '@/flows/machine/rows';
import { liveAboveLimits } from '@/flows/machine/secondPerson';
import type { RowView } from '@/flows/machine/view';
import { mayBeLive } from '@/flows/machine/arrive';
import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { Button } from '@/shared/ui/components/Button';
import { QUANTITIES } from '@/shared/quantity/quantities';
import { ReadingEntry } from '@/shared/ui/components/ReadingEntry';
import { ReadingScale } from '@/shared/ui/components/ReadingScale';
import { Verdict } from '@/shared/ui/components/Verdict';
import { Countdown } from '@/shared/ui/screens/run/Countdown';
import { DoneRows } from '@/shared/ui/screens/run/DoneRows';
import { judgeTyped, limitWords } from '@/shared/ui/screens/run/judgeTyped';
import type { Typed } from '@/shared/ui/screens/run/judgeTyped';
import { MeterChoice } from '@/shared/ui/screens/run/MeterChoice';
import { meterWords } from '@/shared/ui/screens/run/meters';
import { ReadingChoices } from '@/shared/ui/screens/run/ReadingChoices';
import { RowTitle } from '@/shared/ui/screens/run/RowTitle';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { readingNow } from '@/shared/ui/screens/run/readingNow';
import { scaleShown } from '@/shared/ui/screens/run/scaleShown';
import { SecondPerson } from '@/shared/ui/screens/run/SecondPerson';
import { StepBody } from '@/shared/ui/screens/run/StepBody';
import { useMeter } from '@/shared/ui/screens/run/useMeter';
import { useOpen } from '@/shared/ui/screens/run/useOpen';
import { space } from '@/shared/ui/theme/space';

/** Give it a new key for each row: what was typed belongs to one row. */
export function ReadingRowStep({ run, current }: { run: Run; current: RowView & { row: ReadingRow } }) {
  const { view, state, program } = run;
  const { row, opensAt } = current;
  const open = useOpen(opensAt);
  const [text, setText] = useState('');
  const [asked, setAsked] = useState<string | null>(null);
  const meter = useMeter(run, row);
  const placed = program.layout.steps.get(view.key);
  if (placed !== undefined && state.context.second === null && liveAboveLimits(row, placed)) return <SecondPerson run={run} />;

  const live = mayBeLive(state.context);
  const typed = judgeTyped(row, text, meter.chosen, live);
  const record = (what: Typed, falling: boolean) => {
    if (what.value === null || meter.chosen === null) return;
    if (what.doubt !== null && asked !== what.echo) {
      setAsked(what.echo);
      return;
    }
    meter.use(meter.chosen);
    const instrument = { id: meter.chosen.id, twoPole: meter.chosen.twoPole, uncertainty: what.uncertainty };
    void run.send({
      type: 'READING',
      step: view.key,
      row: row.id,
      value: what.value,
      typed: text.trim(),
      instrument,
      ...(falling ? { falling: true } : {}),
    });
  };
  const decline = (word: string) => void run.send({ type: 'ROW', step: view.key, row: row.id, word });
  const doubted = typed.doubt !== null && asked === typed.echo;
  const unit = QUANTITIES[row.quantity].unit;
  const still = !open || run.busy;

  const dock = (
    <>
      <RowTitle rows={view.rows} current={row} />
      <ReadingEntry
        label="Limit"
        limit={limitWords(row)}
        name={`${row.label}, in ${unit}`}
        value={text}
        unit={unit}
        error={typed.fault ?? undefined}
        autoFocus={view.rows.some((r) => r.answer !== null)}
        onChangeText={(next) => {
          setText(next);
          setAsked(null);
        }}
        onSubmit={() => (still ? undefined : record(typed, false))}
      />
      <ReadingChoices choices={typed.choices} onChoose={setText} />
      {typed.value === null ? null : <ReadingScale {...scaleShown(row, typed.value, typed.uncertainty)} />}
      {opensAt !== null && !open ? <Countdown opensAt={opensAt} what="until it may be read" /> : null}
      {typed.verdict ? (
        <Verdict
          mark={typed.verdict.mark}
          word={`${typed.verdict.word}: ${typed.verdict.note}`}
          note={doubted ? (typed.doubt ?? undefined) : undefined}
        />
      ) : null}
      <BigAnswer
        kind="primary"
        label={typed.echo === null ? 'Record' : doubted ? `Yes, record ${typed.echo}` : `Record ${typed.echo}`}
        disabled={still || typed.value === null}
        onPress={() => record(typed, false)}
      />
      <AnswerStack row>
        {row.mayFall && typed.high && typed.value !== 'over' ? (
          <BigAnswer half label="It is falling" disabled={still} onPress={() => record(typed, true)} />
        ) : null}
        <BigAnswer half label="Not sure" disabled={run.busy || !open} onPress={() => decline('not-sure')} />
        <BigAnswer half label="Cannot measure" disabled={run.busy || !open} onPress={() => decline('cannot')} />
      </AnswerStack>
    </>
  );
  return (
    <RunFrame run={run} dock={dock}>
      <StepBody run={run} row={row} now={readingNow(row, typed, meter.chosen)} />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', gap: space.s }}>
        <MeterChoice run={run} row={row} meter={meter} words={meter.chosen === null ? null : meterWords(meter.chosen, typed.range)} />
        <Button kind="quiet" label="Over range" disabled={run.busy || meter.chosen === null} onPress={() => setText('OL')} />
      </View>
      <DoneRows rows={view.rows} />
    </RunFrame>
  );
}
