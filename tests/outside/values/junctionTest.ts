/** Published readings of diodes, transistors and thyristors, and what their sources say of them. */
import type { OutsideValue, SheetValue } from '@/tests/outside/outsideValue';

const fluke = 'Fluke 80 Series V manual, p. 30: 0.5 to 0.8 V good silicon, 0.100 V or less shorted, OL open';
const fluke12 = 'Fluke 12 manual, p. 11: good about 0.6 V and OL reversed; shorted: beeps in at least one direction; open: OL both ways';
const keysight = 'Keysight U1271A manual, p. 81: 0.3 to 0.8 V typical; shorted about 0 V both ways; OL both ways open';
const flir = 'FLIR CM174 manual, p. 21: 0.40 to 0.80 V; 0 V both ways shorted; OL both ways open';
const thyristor = 'Meter maker’s note on thyristors (gvda-instrument.com): gate to cathode 0.2 to 0.8 V, anode OL';
const thyristor2 = 'Thyristor test note (scienceinsights.org): a good part read 0.235 V from gate to cathode, OL otherwise';
const transistor =
  'Textbook chapter on diodes and transistors (learn.mikroe.com): both junctions conduct from the base of an NPN and block reversed';

const two = (forward: string, reverse: string) => [
  { red: 'anode', black: 'cathode', shown: forward },
  { red: 'cathode', black: 'anode', shown: reverse },
];
const three = (...rows: readonly (readonly [red: string, black: string, shown: string])[]) =>
  rows.map(([red, black, shown]) => ({ red, black, shown }));

const row = (
  what: string,
  source: string,
  readings: readonly { red: string; black: string; shown: string }[],
  expected: string,
  { part = 'diode', circuit = 'out-of-circuit', read = 'says' } = {},
): SheetValue => ({ sheet: 'junction-test', what, source, given: { part, circuit, readings }, read, expected });

const gate = three(
  ['gate', 'cathode', '0.235'],
  ['anode', 'cathode', 'OL'],
  ['cathode', 'anode', 'OL'],
  ['gate', 'anode', 'OL'],
  ['anode', 'gate', 'OL'],
);
const npn = three(
  ['base', 'emitter', '0.65'],
  ['base', 'collector', '0.64'],
  ['emitter', 'base', 'OL'],
  ['collector', 'base', 'OL'],
  ['collector', 'emitter', 'OL'],
  ['emitter', 'collector', 'OL'],
);

export const values: readonly OutsideValue[] = [
  row('0.5 V and OL', fluke, two('0.5', 'OL'), 'good'),
  row('0.8 V and OL', fluke, two('0.8', 'OL'), 'good'),
  row('0.6 V and OL is silicon', fluke12, two('0.6', 'OL'), 'silicon', { read: 'junction' }),
  row('0.100 V and OL', fluke, two('0.100', 'OL'), 'short'),
  row('0.05 V both ways', keysight, two('0.05', '0.05'), 'short'),
  row('0 V both ways', flir, two('0', '0'), 'short'),
  row('short in one direction only', fluke12, two('0.62', '0.02'), 'short'),
  row('OL both ways', fluke, two('OL', 'OL'), 'open'),
  row(
    'OL both ways, in circuit',
    'Fluke 80 Series V manual, p. 30: in circuit other paths change the reading; they can only lower it',
    two('OL', 'OL'),
    'open',
    {
      circuit: 'in-circuit',
    },
  ),
  row(
    'finite both ways, in circuit',
    'Fluke 80 Series V manual, p. 30: in circuit the reverse reading depends on other paths',
    two('0.6', '0.75'),
    'lift-a-lead',
    {
      circuit: 'in-circuit',
    },
  ),
  row(
    'finite both ways, out of circuit',
    'Common practice, no source: a diode that conducts both ways alone is leaky',
    two('0.6', '1.4'),
    'leaky',
  ),
  row('0.25 V, germanium', 'Device maker’s note (ctksemi.com): germanium 0.2 to 0.3 V', two('0.25', 'OL'), 'low-drop', {
    read: 'junction',
  }),
  row('0.35 V, Schottky', 'Device maker’s guide (qtech-power.com): Schottky 0.2 to 0.4 V', two('0.35', 'OL'), 'low-drop', {
    read: 'junction',
  }),
  row('0.9 V, silicon rectifier', 'Device maker’s guide (qtech-power.com): silicon 0.5 to 0.9 V', two('0.9', 'OL'), 'silicon', {
    read: 'junction',
  }),
  row('gate 0.235 V, anode OL', thyristor2, gate, 'good', { part: 'thyristor' }),
  row(
    'gate 0.8 V',
    thyristor,
    gate.map((one, at) => (at === 0 ? { ...one, shown: '0.8' } : one)),
    'good',
    { part: 'thyristor' },
  ),
  row(
    'anode to cathode conducts',
    thyristor2,
    gate.map((one, at) => (at === 1 ? { ...one, shown: '0.01' } : one)),
    'short',
    { part: 'thyristor' },
  ),
  row('NPN, all six as printed', transistor, npn, 'good', { part: 'npn-transistor' }),
  row(
    'PNP is the mirror of NPN',
    transistor,
    npn.map(({ red, black, shown }) => ({ red: black, black: red, shown })),
    'good',
    { part: 'pnp-transistor' },
  ),
  row(
    'NPN base open',
    'Testing note (projectcircuitpack): both junctions must read alike; high both ways is open',
    npn.map((one, at) => (at === 0 ? { ...one, shown: 'OL' } : one)),
    'open',
    {
      part: 'npn-transistor',
    },
  ),
];
