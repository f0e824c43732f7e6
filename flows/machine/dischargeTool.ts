/** The discharge resistor of a step: its author's, or the one that the workings choose for this machine (H3). */
import { chooseResistor, energyJoules, judgeResistor, secondsToFall } from '@/shared/workings/discharge';

import type { Profile, Store } from '../document/profile';
import type { Settings } from '../document/settings';
import type { StepOf } from '../document/steps';
import { partsToDischarge } from '../facts/stores';

export interface DischargeTool {
  ohms: number;
  watts: number;
}

/** An old electrolytic may hold half as much again as it is marked. Common practice, no source. */
const ABOVE_MARKING = 1.5;
/** The tool where nothing asks for another: 100 Ω, 50 W, wire-wound. */
const USUAL: DischargeTool = { ohms: 100, watts: 50 };

/** Parts that a discharge step asks for: those that H3 names, else every part that stores energy. */
export function partsOf(profile: Profile, settings: Settings): Store[] {
  const must = partsToDischarge(profile, settings);
  return must.length > 0 ? must : profile.stores;
}

/** One tool for every part of the machine. */
export function dischargeTool(step: StepOf<'discharge'>, profile: Profile, settings: Settings): DischargeTool {
  if (step.toolOhms !== undefined && step.toolWatts !== undefined) return { ohms: step.toolOhms, watts: step.toolWatts };
  const parts = partsOf(profile, settings);
  if (parts.every((p) => stands(USUAL, p))) return USUAL;
  const chosen = parts.flatMap((p) => chooseResistor(p.farads * ABOVE_MARKING, p.voltsWorked, settings.deadVolts, USUAL.watts) ?? []);
  return { ohms: Math.max(USUAL.ohms, ...chosen.map((c) => c.ohms)), watts: Math.max(USUAL.watts, ...chosen.map((c) => c.watts)) };
}

/** Parts that the tool cannot take: each is a finding, for a resistor that burns out leaves its charge behind. */
export function tooSmallFor(tool: DischargeTool, profile: Profile, settings: Settings): Store[] {
  return partsOf(profile, settings).filter((p) => !stands(tool, p));
}

/** Whole seconds until a part is at the dead limit through the tool alone: the fitted bleeder is not trusted, the part taken above its marking. */
export function dischargeSeconds(store: Store, tool: DischargeTool, settings: Settings): number {
  return Math.ceil(secondsToFall(store.farads * ABOVE_MARKING, tool.ohms, store.voltsWorked, settings.deadVolts));
}

function stands(tool: DischargeTool, part: Store): boolean {
  return judgeResistor(part.voltsWorked ** 2 / tool.ohms, energyJoules(part.farads * ABOVE_MARKING, part.voltsWorked), tool.watts) !== 'too-small';
}
