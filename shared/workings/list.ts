/** Every sheet, in the order in which a list shows them. */
import { sheet as bleedDown } from '@/shared/workings/bleedDown';
import { sheet as fuseInrush } from '@/shared/workings/fuseInrush';
import { sheet as junctionTest } from '@/shared/workings/junctionTest';
import { sheet as lostReturn } from '@/shared/workings/lostReturn';
import { sheet as overVoltageTrip } from '@/shared/workings/overVoltageTrip';
import { sheet as passElement } from '@/shared/workings/passElement';
import { sheet as railLimits } from '@/shared/workings/railLimits';
import { sheet as railLoadPlan } from '@/shared/workings/railLoadPlan';
import { sheet as readingLimit } from '@/shared/workings/readingLimit';
import { sheet as reforming } from '@/shared/workings/reforming';
import { sheet as refitTrip } from '@/shared/workings/refitTrip';
import { sheet as seriesLamp } from '@/shared/workings/seriesLamp';
import type { Sheet } from '@/shared/workings/sheet';
import { sheet as smoothingRipple } from '@/shared/workings/smoothingRipple';
import { sheet as switchingRegulator } from '@/shared/workings/switchingRegulator';
import { sheet as wireDrop } from '@/shared/workings/wireDrop';

/** A sheet whose own types are not known where it is listed; feed it through `runSheet`, which parses first. */
export type AnySheet = Sheet;

// A list forgets each sheet's own input type; only runSheet, which parses by that sheet's schema, may call compute.
export const SHEETS: readonly AnySheet[] = [
  seriesLamp,
  bleedDown,
  reforming,
  railLoadPlan,
  passElement,
  switchingRegulator,
  smoothingRipple,
  lostReturn,
  railLimits,
  readingLimit,
  wireDrop,
  fuseInrush,
  overVoltageTrip,
  junctionTest,
  refitTrip,
] as readonly unknown[] as readonly AnySheet[];

/** The sheet of that id, or undefined. */
export function sheetById(id: string): AnySheet | undefined {
  return SHEETS.find((sheet) => sheet.id === id);
}
