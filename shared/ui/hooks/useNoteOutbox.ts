/** Notes for a run from a page that does not lead it. */
import { useEffect, useState, useSyncExternalStore } from 'react';

import { client } from '@/shared/ui/api/client';
import { openNoteOutbox } from '@/shared/ui/api/noteOutbox';
import type { NoteOutbox } from '@/shared/ui/api/noteOutbox';
import type { Saved } from '@/shared/ui/api/outbox';
import { openOutboxStore } from '@/shared/ui/api/outboxStore';
import { pause } from '@/shared/ui/hooks/pause';

/** The outbox of that run's notes, or null while it opens or no run is chosen. It closes with its page; what waits then is sent when the run is on the screen again. */
export function useNoteOutbox(run: string | null, person: string): NoteOutbox | null {
  const [box, setBox] = useState<{ run: string; box: NoteOutbox } | null>(null);
  useEffect(() => {
    if (run === null) return undefined;
    const opened: { box: NoteOutbox | null; over: boolean } = { box: null, over: false };
    const online = () => opened.box?.kick();
    void (async () => {
      const next = await openNoteOutbox({ run, person, store: await openOutboxStore(), client, pause });
      if (opened.over) {
        next.close();
        return;
      }
      opened.box = next;
      setBox({ run, box: next });
    })();
    window.addEventListener('online', online);
    return () => {
      opened.over = true;
      opened.box?.close();
      window.removeEventListener('online', online);
    };
  }, [run, person]);
  return box !== null && box.run === run ? box.box : null;
}

const NO_CHANGE = () => () => undefined;

/** How the notes of that outbox stand, or null without one. */
export function useNotesSaved(box: NoteOutbox | null): Saved | null {
  return useSyncExternalStore(box?.onSaved ?? NO_CHANGE, () => box?.saved() ?? null);
}
