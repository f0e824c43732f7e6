/** The guard before power: three things looked at, then a button that has to be held. */
import { useState } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Checkbox } from '@/shared/ui/components/Checkbox';
import { HoldButton } from '@/shared/ui/components/HoldButton';
import { Notice } from '@/shared/ui/components/Notice';
import { circuitOf } from '@/shared/ui/screens/run/bandWords';
import { guardChecks, guardTold } from '@/shared/ui/screens/run/guardWords';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepHead } from '@/shared/ui/screens/run/StepHead';
import { useLongWait } from '@/shared/ui/screens/run/useLongWait';

/** Phase `guard`. */
export function GuardStep({ run }: { run: Run }) {
  const { view, program, refusal } = run;
  const [ticked, setTicked] = useState<readonly string[]>([]);
  const unsent = useLongWait(run.saved);
  const { step } = view;
  if (step?.kind !== 'energise' && step?.kind !== 'raise') return null;
  const checks = guardChecks(step, program.layout.profile);
  const holdMs = program.layout.settings.guardHoldSeconds * 1000;
  const ready = checks.every((c) => ticked.includes(c.id));
  // the engine wants the time that it was really held; the button confirms no earlier
  const held = () => void run.send({ type: 'GUARD_HELD', step: view.key, heldMs: holdMs });
  return (
    <RunFrame
      run={run}
      dock={
        <HoldButton
          key={refusal?.say ?? 'guard'}
          label={ready ? `Hold: ${step.kind === 'raise' ? 'raise the power' : 'power in'}` : 'Tick all three first'}
          holdMs={holdMs}
          disabled={!ready}
          onConfirm={held}
        />
      }
    >
      <StepHead run={run} />
      <Notice title={circuitOf(program, view.key)}>{guardTold(step, program)}</Notice>
      {unsent ? (
        <Notice kind="alarm">The workshop does not know yet that you go live: what you answered has not reached the server.</Notice>
      ) : null}
      <View>
        {checks.map((c) => (
          <Checkbox
            key={c.id}
            label={c.label}
            checked={ticked.includes(c.id)}
            onChange={(on) => setTicked(on ? [...ticked, c.id] : ticked.filter((id) => id !== c.id))}
          />
        ))}
      </View>
      <BodyText size="small" tone="soft">
        Letting go early does nothing. Local codes, the maker’s data and licensed practice come first.
      </BodyText>
    </RunFrame>
  );
}
