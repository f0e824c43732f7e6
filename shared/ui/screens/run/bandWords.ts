/** The second line of the power band. Pure. */
import type { Program } from '@/flows/machine/compile';
import type { RunState } from '@/flows/machine/advance';
import type { RunView } from '@/flows/machine/view';
import { formatQuantity } from '@/shared/quantity/formatQuantity';

const two = (n: number) => String(n).padStart(2, '0');

/** `01:12`, `1:04:09` above an hour; never below zero. */
export function clockOf(ms: number): string {
  const seconds = Math.max(0, Math.floor(ms / 1000));
  const [h, m, s] = [Math.floor(seconds / 3600), Math.floor(seconds / 60) % 60, seconds % 60];
  return h > 0 ? `${h}:${two(m)}:${two(s)}` : `${two(m)}:${two(s)}`;
}

/** The time that is left is named when it is short. */
const SHORT_MS = 120_000;

/** What is in circuit and since when, or what the word above it stands for; the word for what is not known says it all. `now` in epoch milliseconds. */
export function bandDetail(program: Program, state: RunState, view: RunView, now: number): string | undefined {
  const { context } = state;
  const { live } = context;
  if (live !== null) {
    if (now > live.until) return `Time is up: isolate now · live ${clockOf(now - live.since)}`;
    const left = live.until - now;
    const time = left < SHORT_MS ? `${clockOf(left)} left` : `live ${clockOf(now - live.since)}`;
    return `${shortly(program, live.key)} · ${time}`;
  }
  switch (view.band) {
    case 'proved-dead':
      return 'All out, no charge left';
    case 'off':
      return 'All out, charge not proved';
    case 'unknown':
      return undefined;
    case 'lamp':
    case 'bench':
    case 'mains':
      return 'A source is in';
  }
}

/** What an energise or raise puts in circuit. */
export function circuitOf(program: Program, key: string): string {
  const placed = program.layout.steps.get(key);
  if (placed?.step.kind !== 'energise' && placed?.step.kind !== 'raise') return 'A source is in';
  const { through, mostVolts, mostAmps, lampWatts } = placed.step;
  const volts = formatQuantity(mostVolts, 'V', { digits: 3 });
  switch (through) {
    case 'lamp':
      return `${lampWatts === undefined ? 'Lamp' : formatQuantity(lampWatts, 'W', { digits: 3 })} in series, ${volts}`;
    case 'limited-ac':
      return `${volts}, limited to ${formatQuantity(mostAmps, 'A', { digits: 3 })}`;
    case 'bench':
      return `Up to ${volts}, ${formatQuantity(mostAmps, 'A', { digits: 3 })}`;
    case 'mains':
      return `${volts}, full power`;
  }
}

/** The same for the band, where a phone has room for two dozen characters. */
function shortly(program: Program, key: string): string {
  const placed = program.layout.steps.get(key);
  if (placed?.step.kind !== 'energise' && placed?.step.kind !== 'raise') return 'A source is in';
  const { through, mostVolts, mostAmps, lampWatts } = placed.step;
  const volts = formatQuantity(mostVolts, 'V', { digits: 3 });
  if (through === 'lamp' && lampWatts !== undefined) return `${formatQuantity(lampWatts, 'W', { digits: 3 })}, ${volts}`;
  return through === 'mains' ? `${volts}, full` : `${volts}, ${formatQuantity(mostAmps, 'A', { digits: 3 })}`;
}
