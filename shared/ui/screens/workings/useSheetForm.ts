/** What is typed into a sheet, kept in its address, and what the sheet says to it. */
import { useRouter } from 'expo-router';
import { useEffect, useMemo, useRef, useState } from 'react';

import { parametersOf, takenFrom, textsFrom } from '@/shared/ui/screens/workings/sheetAddress';
import type { Given, Taken } from '@/shared/ui/screens/workings/sheetAddress';
import { readSheet, sheetFields, startTexts } from '@/shared/ui/screens/workings/sheetForm';
import type { SheetPart } from '@/shared/ui/screens/workings/sheetPart';
import type { AnySheet } from '@/shared/workings/list';
import type { SheetAnswer } from '@/shared/workings/sheet';
import { runSheet } from '@/shared/workings/sheet';

export interface SheetFormState {
  parts: readonly SheetPart[];
  texts: Record<string, string>;
  taken: Taken | null;
  /** a sentence for each field that cannot be taken */
  errors: Record<string, string>;
  echoes: Record<string, string>;
  /** inputs in SI, complete only where there is an answer */
  inputs: Record<string, unknown>;
  /** null while a field cannot be taken */
  answer: SheetAnswer<unknown> | null;
  /** one field typed */
  type(name: string, text: string): void;
  /** a row more or less: everything typed anew */
  replace(texts: Record<string, string>): void;
  /** fields filled from a machine; the others stay */
  fill(texts: Record<string, string>, machine: string): void;
}

/** Starts with what the address says, over the sheet's example. */
export function useSheetForm(sheet: AnySheet, given: Given): SheetFormState {
  const router = useRouter();
  const parts = useMemo(() => sheetFields(sheet), [sheet]);
  const [form, setForm] = useState(() => ({ texts: textsFrom(parts, startTexts(sheet), given), taken: takenFrom(given), touched: false }));
  const { texts, taken, touched } = form;
  const written = useRef<Given>(given);
  useEffect(() => {
    if (!touched) return;
    const next = parametersOf(texts, taken, written.current);
    written.current = next;
    // the router drops what is undefined; its types know strings only
    router.setParams(next as Record<string, string>);
  }, [texts, taken, touched, router]);
  const read = useMemo(() => readSheet(parts, texts), [parts, texts]);
  const worked = useMemo(() => (Object.keys(read.errors).length > 0 ? null : runSheet(sheet, read.inputs)), [sheet, read]);
  const errors = worked !== null && !worked.ok ? { ...read.errors, [worked.field]: worked.say } : read.errors;
  return {
    parts,
    texts,
    taken,
    errors,
    echoes: read.echoes,
    inputs: read.inputs,
    answer: worked?.ok ? worked : null,
    type: (name, text) =>
      setForm((now) => ({ texts: { ...now.texts, [name]: text }, taken: without(now.taken, (n) => n === name), touched: true })),
    replace: (next) =>
      setForm((now) => ({
        texts: next,
        // rows that move take no mark with them
        taken: without(now.taken, (n) => n.includes('.') && now.texts[n] !== next[n]),
        touched: true,
      })),
    fill: (filled, machine) =>
      setForm((now) => ({ texts: { ...now.texts, ...filled }, taken: { machine, names: new Set(Object.keys(filled)) }, touched: true })),
  };
}

function without(taken: Taken | null, gone: (name: string) => boolean): Taken | null {
  return taken === null ? null : { ...taken, names: new Set([...taken.names].filter((name) => !gone(name))) };
}
