/** Judges a logged reforming curve: is it forming, has it formed, or must it stop. */
import { STOP_WATTS } from '@/shared/workings/reformPlan';

/** One line of the log. */
export interface ReformReading {
  readonly minutes: number;
  /** Set on the supply. */
  readonly volts: number;
  readonly amps: number;
}

/** What the curve says. */
export type ReformSays = 'too-early' | 'falling' | 'next-stage' | 'formed' | 'stalled' | 'rising' | 'too-hot';

/** The verdict with its numbers. */
export interface ReformVerdict {
  readonly says: ReformSays;
  /** On the capacitor at the last reading. */
  readonly capacitorVolts: number;
  readonly canWatts: number;
  /** Minutes from the last reading until it is done at this stage, if it goes on like this; null where that cannot be said. */
  readonly minutesToGo: number | null;
}

/** What each verdict means, without a full stop. */
export const REFORM_WORDS: Readonly<Record<ReformSays, string>> = {
  'too-early': 'Too early to say: it still charges. Go on reading',
  falling: 'It is forming: the leakage falls. Stay at these volts',
  'next-stage': 'Done at these volts: go on to the next stage',
  formed: 'Formed: the leakage is within the limit at the full volts',
  stalled: 'Stop: the leakage no longer falls and is above the limit. Replace it',
  rising: 'Stop at once: the leakage rises. Volts off, discharge, replace it',
  'too-hot': 'Stop at once: too much heat in the can. Volts off, discharge, let it cool',
};

/** Rise above the least reading of a stage that counts as rising; fall within ten minutes below which it counts as stalled. Common practice, no source. */
const RISES = 1.2;
const STALLS = 0.05;
const STALL_MINUTES = 10;
/** A forecast further off than this says nothing. */
const FAR_MINUTES = 48 * 60;

interface Judged {
  readonly ohms: number;
  readonly timeConstantSeconds: number;
  readonly targetVolts: number;
  /** Done at some volts of the supply at or below these amps. */
  readonly doneAt: (volts: number) => number;
}

/**
 * Judges the last stage of a log, the readings at the last volts that were set.
 * @param log two or more, minutes rising
 */
export function judgeReforming(log: readonly ReformReading[], judged: Judged): ReformVerdict | null {
  const last = log.at(-1);
  if (last === undefined) return null;
  const capacitorVolts = Math.max(0, last.volts - last.amps * judged.ohms);
  const canWatts = capacitorVolts * last.amps;
  const say = (says: ReformSays, minutesToGo: number | null = null): ReformVerdict => ({ says, capacitorVolts, canWatts, minutesToGo });
  // The heat counts even while it charges: nothing of the rest must hide it.
  if (canWatts > STOP_WATTS) return say('too-hot');
  const { stage, startMinutes } = lastStage(log, last);
  const settled = stage.filter(({ minutes }) => (minutes - startMinutes) * 60 >= 5 * judged.timeConstantSeconds);
  const done = judged.doneAt(last.volts);
  if (settled.length < 2) return say('too-early');
  const least = Math.min(...settled.map(({ amps }) => amps));
  if (last.amps > RISES * least && last.amps > done / 10) return say('rising');
  if (last.amps <= done) return say(last.volts >= judged.targetVolts * 0.98 ? 'formed' : 'next-stage');
  const earlier = [...settled].reverse().find(({ minutes }) => last.minutes - minutes >= STALL_MINUTES);
  if (earlier !== undefined && last.amps > earlier.amps * (1 - STALLS)) return say('stalled');
  return say('falling', forecast(settled, startMinutes, done));
}

function lastStage(log: readonly ReformReading[], last: ReformReading): { stage: readonly ReformReading[]; startMinutes: number } {
  let from = log.length - 1;
  while (from > 0 && Math.abs((log[from - 1]?.volts ?? 0) - last.volts) <= 0.02 * last.volts) from -= 1;
  const stage = log.slice(from);
  // The volts were raised some time after the reading before; taken as at it, so that charging is not given less time than it had.
  return { stage, startMinutes: stage[0]?.minutes ?? 0 };
}

/** Minutes until a power law through the readings, ln I over ln t, reaches the limit. */
function forecast(readings: readonly ReformReading[], startMinutes: number, doneAmps: number): number | null {
  const points = readings.flatMap(({ minutes, amps }) =>
    minutes > startMinutes && amps > 0 ? [[Math.log(minutes - startMinutes), Math.log(amps)] as const] : [],
  );
  const last = points.at(-1);
  if (points.length < 2 || last === undefined) return null;
  const mean = (at: 0 | 1): number => points.reduce((sum, point) => sum + point[at], 0) / points.length;
  const [x, y] = [mean(0), mean(1)];
  const slope =
    points.reduce((sum, point) => sum + (point[0] - x) * (point[1] - y), 0) / points.reduce((sum, point) => sum + (point[0] - x) ** 2, 0);
  if (!(slope < -0.05)) return null;
  const minutes = Math.exp(x + (Math.log(doneAmps) - y) / slope) - Math.exp(last[0]);
  return minutes > 0 && minutes <= FAR_MINUTES ? minutes : null;
}
