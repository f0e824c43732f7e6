/** The series lamp as a deck: the lamp a behavioural current, the load a resistance or a current that holds its watts. */
import type { Lamp } from '@/shared/workings/lamp';
import { coldOhms, CURRENT_EXPONENT, hotOhms } from '@/shared/workings/lamp';

/** What hangs behind the lamp. */
export type DeckLoad = { readonly ohms: number } | { readonly watts: number };

/**
 * Mains as its r.m.s. value in d.c.; node `load` carries the load's volts.
 * @param nearVolts load volts to begin from: a load that holds its watts has two answers, and the start picks the one
 */
export function lampDeck(lamp: Lamp, supplyVolts: number, load: DeckLoad, nearVolts: number): string {
  const across = 'abs(V(mains,load))';
  const law = `${String(hotOhms(lamp))}*((${across}+1e-12)/${String(lamp.ratedVolts)})^${String(1 - CURRENT_EXPONENT)}`;
  const behind = 'ohms' in load ? `Rload load 0 ${String(load.ohms)}` : `Bload load 0 I=${String(load.watts)}/max(V(load),1e-3)`;
  return [
    '* lamp in series',
    `Vmains mains 0 ${String(supplyVolts)}`,
    `Blamp mains load I=V(mains,load)/max(${String(coldOhms(lamp))},${law})`,
    behind,
    `.nodeset V(load)=${String(nearVolts)}`,
    '.options reltol=1e-7 abstol=1e-12 vntol=1e-9 itl1=500',
    '.end',
    '',
  ].join('\n');
}
