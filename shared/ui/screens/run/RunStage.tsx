/** A run with its program and its outbox: what leads the restorer from step to step. */
import { useMemo } from 'react';

import type { Program } from '@/flows/machine/compile';
import { compile } from '@/flows/machine/compile';
import type { RunBundle } from '@/shared/contract/runs';
import { ErrorState } from '@/shared/ui/components/ErrorState';
import { Loading } from '@/shared/ui/components/Loading';
import { Page } from '@/shared/ui/components/Page';
import { headSeq } from '@/shared/ui/api/ledger';
import { useRunMachine } from '@/shared/ui/hooks/useRunMachine';
import { useRunOutbox } from '@/shared/ui/hooks/useRunOutbox';
import type { RunOutbox } from '@/shared/ui/hooks/useRunOutbox';
import { HandedOver } from '@/shared/ui/screens/run/HandedOver';
import { OverdueNotice } from '@/shared/ui/screens/run/OverdueNotice';
import { RunStep } from '@/shared/ui/screens/run/RunStep';

/** Compiles the run's own pinned documents; the server does the same with the same code. */
export function RunStage({ bundle, person }: { bundle: RunBundle; person: string }) {
  const compiled = useMemo(
    () => compile({ tree: bundle.tree, callees: bundle.callees, profile: bundle.profile, settings: bundle.settings }),
    [bundle],
  );
  // the rules of another engine may lead elsewhere: neither side goes on under them
  if (!compiled.ok || bundle.pins.engine !== compiled.program.engine) {
    return (
      <Page>
        <ErrorState
          happened="This run cannot be led by this version of the application."
          todo="Make the bench safe: every source out, discharge, prove dead. Then load the page again, or tell a senior."
        />
      </Page>
    );
  }
  return <WithOutbox bundle={bundle} person={person} program={compiled.program} />;
}

function WithOutbox({ bundle, person, program }: { bundle: RunBundle; person: string; program: Program }) {
  const run = useRunOutbox(bundle, program, person);
  if (run === null) {
    return (
      <Page>
        <Loading what="the run" />
      </Page>
    );
  }
  return <AtTheBench key={run.epoch} bundle={bundle} program={program} person={person} outbox={run} />;
}

function AtTheBench({ bundle, program, person, outbox }: { bundle: RunBundle; program: Program; person: string; outbox: RunOutbox }) {
  const machine = useRunMachine(program, bundle.start, outbox);
  const run = { ...machine, program, bundle, poll: outbox.outbox.poll, headSeq: () => headSeq(outbox.outbox.ledger()) };
  if (machine.view.restorer !== person) return <HandedOver run={run} />;
  return (
    <>
      <RunStep run={run} />
      <OverdueNotice run={run} />
    </>
  );
}
