/** The run is somebody else's now. */
import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';

import { queryKeyOf } from '@/shared/ui/api/queries';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Page } from '@/shared/ui/components/Page';
import type { Run } from '@/shared/ui/screens/run/Run';
import { NotTakenNotice } from '@/shared/ui/screens/run/NotTakenNotice';
import { personName } from '@/shared/ui/screens/shell/personName';

/** What the one who gave it is left with: nothing can be answered here any more. */
export function HandedOver({ run }: { run: Run }) {
  const queries = useQueryClient();
  useEffect(() => {
    void queries.invalidateQueries({ queryKey: queryKeyOf('runs') });
  }, [queries]);
  const who = personName(run.bundle.people, run.view.restorer);
  return (
    <Page title={`${run.bundle.run.machine.name}, serial ${run.bundle.run.machine.serial}`}>
      <NotTakenNotice run={run} />
      <EmptyState
        title={`${who} has taken this run over`}
        text={`Only ${who} can answer its steps now. You stand in its record as one who led it, so you neither countersign in it nor review it.`}
        action={<LinkText label="To the bench" href="/bench" />}
      />
    </Page>
  );
}
