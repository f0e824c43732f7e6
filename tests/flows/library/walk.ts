/** The trees of the library and the machines of the demo, and a person who walks one on the other. */
import { readFileSync } from 'node:fs';

import { parseProfile, parseTree } from '@/flows/document/parseTree';
import type { Profile } from '@/flows/document/profile';
import type { Tree } from '@/flows/document/tree';
import type { Program } from '@/flows/machine/compile';
import type { Row } from '@/flows/machine/rows';
import { oddProfiles } from '@/flows/proof/oddProfiles';
import { Bench, must, program } from '../support/bench';

const json = (path: string): unknown => JSON.parse(readFileSync(new URL(`../../../${path}`, import.meta.url), 'utf8'));

/** A tree of the library by its id. */
export const libraryTree = (id: string): Tree => must(parseTree(json(`flows/library/${id}.json`)));
/** The tree as its author wrote it, to be changed by a test. */
export const libraryJson = (id: string): { steps: Record<string, unknown>[] } & Record<string, unknown> => json(`flows/library/${id}.json`) as never;
/** A machine of the demo by its file's name. */
export const demoProfile = (name: string): Profile => must(parseProfile(json(`db/seeds/demo/profiles/${name}.json`)));

export const makeDead = libraryTree('make-dead');
/** A machine of the demo by its file's name, or an odd one by its title. */
export const machineNamed = (name: string): Profile => oddProfiles.find((profile) => profile.title === name) ?? demoProfile(name);
export const programOf = (tree: Tree, machine: string): Program => program(tree, machineNamed(machine), [makeDead]);

/** What a person answers at a step: an answer's id, or readings and words by row (`*` for every row). */
export type Choice = string | Record<string, number | 'over' | string>;
export type Choices = Record<string, Choice>;

/** Answers of a good run. A linear regulator has no freewheel diode. */
export const LINEAR: Choices = { 'regulator-kind': 'linear' };

/** A reading that is well inside the limits of its row. */
export function goodReading(row: Row): number | string {
  if (row.ask === 'word') return row.words[0]?.word ?? '';
  if (row.nominal !== null) return row.nominal;
  if (row.low !== null && row.high !== null) return (row.low + row.high) / 2;
  return row.low !== null ? row.low * 2 : (row.high ?? 1) * 0.2;
}

/** A choice by the key of a step, or by its id in whichever call. */
function choiceAt(choices: Choices, key: string): Choice | undefined {
  return choices[key] ?? choices[key.split('/').at(-1) ?? key];
}

/** One move of a person at the bench: warning, hold, guard, row or answer. */
export function move(bench: Bench, choices: Choices): void {
  const { phase, key, current, answers } = bench.view;
  if (phase === 'warning') bench.do({ type: 'WARNING_READ', step: key });
  else if (phase === 'hold') bench.do({ type: 'HOLD_ASKED', step: key });
  else if (phase === 'hold-wait') bench.do({ type: 'HOLD_GIVEN', step: key, by: 'sam' });
  else if (phase === 'guard') bench.do({ type: 'GUARD_HELD', step: key, heldMs: 2100 });
  else if (bench.view.step?.kind === 'hold') bench.do({ type: 'HOLD_ASKED', step: key });
  else if (current !== null) {
    const choice = choiceAt(choices, key);
    const given = typeof choice === 'object' ? (choice[current.row.id] ?? choice['*']) : undefined;
    bench.row({ [current.row.id]: given ?? goodReading(current.row) });
  } else {
    const choice = choiceAt(choices, key);
    if (bench.view.step?.kind === 'photo' && typeof choice !== 'string') bench.do({ type: 'PHOTO', step: key, photo: NO_PHOTO });
    else bench.do({ type: 'ANSWER', step: key, answer: typeof choice === 'string' ? choice : (answers[0]?.answer ?? '') });
  }
}

/** A photo that nobody took. */
export const NO_PHOTO = '0'.repeat(64);

/** Walks until the run has ended or `until` says so; a choice is made each time that its step comes. */
export function walk(bench: Bench, choices: Choices = {}, until: (bench: Bench) => boolean = () => false): Bench {
  for (let i = 0; i < 3000; i += 1) {
    if (bench.view.phase === 'ended' || until(bench)) return bench;
    move(bench, choices);
  }
  throw new Error(`no end in sight at ${bench.view.key}/${bench.view.phase}`);
}

/** Walks up to the first arrival at a step, in the phase asked for or any. */
export const walkTo = (bench: Bench, key: string, choices: Choices = {}, phase?: string): Bench =>
  walk(bench, choices, (b) => b.view.key === key && (phase === undefined || b.view.phase === phase));
