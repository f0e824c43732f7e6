/** Starting a run: the machine, then one of the issued trees that apply to it. */
import { useState } from 'react';

import type { Machine } from '@/shared/contract/machines';
import { useMachines } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Choice } from '@/shared/ui/components/Choice';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { TreesFor } from '@/shared/ui/screens/bench/TreesFor';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';

/** Machines with an open run are named but cannot be chosen: one run at a time works on a machine. */
export function StartRun({ machine: asked }: { machine?: string | undefined }) {
  const machines = useMachines();
  const [chosen, setChosen] = useState<string | null>(asked ?? null);
  return (
    <Fetched query={machines} what="the machines">
      {({ machines: all }) => {
        const free = all.filter((m) => m.openRun === null);
        const busy = all.filter((m) => m.openRun !== null);
        if (free.length === 0)
          return (
            <EmptyState
              title="No machine is free"
              text={busy.length === 0 ? 'The workshop has no machine yet.' : `A run is open on ${namesOf(busy)}. Close it first.`}
            />
          );
        const machine = free.find((m) => m.id === chosen) ?? null;
        return (
          <>
            <Choice
              label="Machine"
              value={chosen}
              options={free.map((m) => ({ value: m.id, label: `${m.name}, serial ${m.serial}`, detail: detailOf(m) }))}
              onChange={setChosen}
            />
            {busy.length > 0 ? <BodyText size="small" tone="soft">{`A run is open on ${namesOf(busy)}.`}</BodyText> : null}
            {machine === null ? null : <TreesFor key={machine.id} machine={machine} />}
          </>
        );
      }}
    </Fetched>
  );
}

function namesOf(machines: readonly Machine[]): string {
  return machines.map((m) => m.name).join(' and ');
}

function detailOf(m: Machine): string {
  const left = m.tags === 0 ? '' : m.tags === 1 ? '; 1 thing left in or owed' : `; ${m.tags} things left in or owed`;
  return `${m.machineClass}, profile revision ${m.revision}${left}`;
}
