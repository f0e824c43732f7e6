/** `npm run bench:workings`: a lost-return sheet of 60 nodes with 10 returns, and the same networks in ngspice, in one run. */
import type { z } from 'zod';

import { sheet } from '@/shared/workings/lostReturn';
import type { SolvedCase } from '@/shared/workings/lostReturnCases';
import { solveCases } from '@/shared/workings/lostReturnCases';
import type { lostReturnInputs } from '@/shared/workings/lostReturnInputs';
import { lostReturnModel } from '@/shared/workings/lostReturnModel';
import { solve } from '@/shared/workings/network/network';
import { runSheet } from '@/shared/workings/sheet';

import { networkDeck, operatingPoints } from '../outside/ngspice/ngspice';
import { randomCase } from '../outside/ngspice/randomNetwork';

type Inputs = z.input<typeof lostReturnInputs>;

const RAILS = [
  { name: '+5 V', volts: 5, limitAmps: 60, amps: 1.8 },
  { name: '+12 V', volts: 12, limitAmps: 8, amps: 0.3 },
  { name: '−12 V', volts: -12, limitAmps: 20, amps: 0.25 },
  { name: '−5 V', volts: -5, limitAmps: 3, amps: 0.05 },
];
const PLACES = Array.from({ length: 10 }, (_, k) => `cage ${String(k + 1)}`);

/** Ten cages with a return each, four rails, four diodes: 4 terminals, 10 far ends, 40 fed points, 0 V and what reaches to 60. */
function bigSupply(): Inputs {
  const places = PLACES.flatMap((place) => RAILS.map((rail) => ({ place, rail, node: `${rail.name} ${place}` })));
  return {
    rails: RAILS.map(({ name, volts, limitAmps }) => ({ name, volts, limitAmps })),
    returns: PLACES.map((place, k) => ({
      name: `R${String(k + 1)}`,
      from: '0 V',
      to: place,
      squareMillimetres: 2.5,
      metres: 0.4 + 0.05 * k,
    })),
    feeds: [
      ...places.map(({ node, rail }, k) => ({ name: `F${String(k + 1)}`, from: rail.name, to: node, squareMillimetres: 1.5, metres: 0.6 })),
      ...PLACES.slice(0, 5).map((place, k) => ({
        name: `G${String(k + 1)}`,
        from: `+5 V ${place}`,
        to: `+5 V ${place}, slot 2`,
        squareMillimetres: 1.5,
        metres: 0.1,
      })),
    ],
    loads: [
      ...places.map(({ place, rail, node }) => ({ name: `Board of ${place}`, from: node, to: place, amps: rail.amps })),
      ...PLACES.slice(0, 5).map((place) => ({ name: `Second board of ${place}`, from: `+5 V ${place}, slot 2`, to: place, amps: 1 })),
    ],
    diodes: RAILS.map(({ name, volts }, k) => ({
      name: `D${String(k + 1)}`,
      part: 'freewheel' as const,
      ...(volts > 0 ? { anode: '0 V', cathode: name } : { anode: name, cathode: '0 V' }),
      ratedAmps: 6,
    })),
  };
}

/** Best of several, in milliseconds. */
function best(times: number, run: () => void): number {
  let least = Infinity;
  for (let i = 0; i < times; i += 1) {
    const from = performance.now();
    run();
    least = Math.min(least, performance.now() - from);
  }
  return least;
}

const inputs = bigSupply();
const model = lostReturnModel(sheet.inputs.parse(inputs));
if ('ok' in model) throw new Error(`${model.field}: ${model.say}`);
const cases: SolvedCase[] = [];
solveCases(model, (one) => cases.push(one));

const coldFrom = performance.now();
const answer = runSheet(sheet, inputs);
const coldMs = performance.now() - coldFrom;
if (!answer.ok) throw new Error(answer.say);
const sheetMs = best(5, () => runSheet(sheet, inputs));
const solveMs = best(5, () => solveCases(model, () => undefined));

// The same networks: every opening with all rails on, and a spread of the states besides, as many as ngspice does in bearable time.
const SAMPLE = 200;
const stride = Math.max(1, Math.floor(cases.length / SAMPLE));
const sample = cases.filter((_, k) => k % stride === 0);
const decks = sample.map(({ opens, states, added }) =>
  networkDeck(model.network, {
    open: opens.flatMap((k) => model.returns[k]?.resistor ?? []),
    off: states.flatMap((state, rail) => (state === 'off' ? [rail] : [])),
    added,
  }),
);
const spiceFrom = performance.now();
const points = operatingPoints(decks);
const spiceMs = performance.now() - spiceFrom;
const aloneMs = best(3, () => operatingPoints(decks.slice(0, 1)));
let apart = 0;
sample.forEach(({ solution }, k) => {
  for (let node = 0; node < model.network.nodes - 1; node += 1) {
    const theirs = points.get(k)?.get(`n${String(node)}`) ?? Number.NaN;
    if (!(Math.abs((solution.volts[node] ?? 0) - theirs) <= Math.max(1e-3, 1e-3 * Math.abs(theirs)))) apart += 1;
  }
});

// Generated supplies, each solved alone and from nothing.
const random = Array.from({ length: 600 }, (_, k) => randomCase(k + 1));
const theirs = operatingPoints(
  random.map(({ network, variation }) => networkDeck(network, variation)),
  600_000,
);
let randomApart = 0;
random.forEach(({ network, variation }, k) => {
  const { volts } = solve(network, variation);
  for (let node = 0; node < network.nodes - 1; node += 1) {
    const there = theirs.get(k)?.get(`n${String(node)}`) ?? Number.NaN;
    if (!(Math.abs((volts[node] ?? 0) - there) <= Math.max(1e-3, 1e-3 * Math.abs(there)))) randomApart += 1;
  }
});

const eachMs = solveMs / cases.length;
const spiceEachMs = spiceMs / sample.length;
const rounded = (value: number): number => Number(value.toPrecision(3));
const holds = sheetMs < 250 && spiceEachMs / eachMs >= 50 && apart === 0 && randomApart === 0;
process.stdout.write(
  `${JSON.stringify(
    {
      sheet: {
        nodes: model.network.nodes,
        returns: model.returns.length,
        openings: answer.result.openings.length,
        cases: cases.length,
        firstMs: rounded(coldMs),
        ms: rounded(sheetMs),
        bar: 'under 250 ms',
      },
      ngspice: {
        cases: sample.length,
        eachMs: rounded(spiceEachMs),
        oursEachMs: rounded(eachMs),
        ratio: rounded(spiceEachMs / eachMs),
        ratioOneProcessEach: rounded(aloneMs / eachMs),
        bar: 'at least 50 times, all decks in one process',
      },
      agreement: { nodesApart: apart, generated: random.length, generatedNodesApart: randomApart, bar: 'none beyond 1 mV or 0.1 %' },
      holds,
    },
    null,
    2,
  )}\n`,
);
process.exitCode = holds ? 0 : 1;
