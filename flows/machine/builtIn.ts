/** The machine's own steps: make safe after Stop, mend what has lapsed, close out at an end. No tree can leave them out. */
import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Exit, Step } from '../document/steps';

const common = { tools: [], minutes: 2, hazards: [] };
// the machine leads on by itself from these; the exits only carry the outcomes
const exits = (on: Exit['on']): Exit[] => [{ id: 'on', on, to: 'on' }];

/** Isolate, discharge, prove dead, put back, take out, read back, and the place after Stop. */
export function builtInSteps(profile: Profile, settings: Settings): Step[] {
  return [
    {
      ...common,
      id: '~isolate',
      kind: 'isolate',
      title: 'Make safe: take every source out',
      lines: ['Switch off, hands clear.', `Pull the plug out of the wall: ${profile.mains.inlet}.`, 'Keep the plug in sight, or lock it off.'],
      contact: 'none',
      exits: exits(['out', 'not-out', 'not-sure']),
    },
    {
      ...common,
      id: '~discharge',
      kind: 'discharge',
      title: 'Make safe: discharge what stores energy',
      lines: ['Clip the discharge tool across each part in turn.', 'Wait out the time, then read the volts across it.'],
      contact: 'probe',
      exits: exits(['in', 'high', 'not-sure', 'cannot']),
    },
    {
      ...common,
      id: '~prove',
      kind: 'prove-dead',
      title: 'Make safe: prove dead',
      lines: ['Prove the two-pole tester on the proving unit.', 'Test every pair and every part.', `Dead is ${settings.deadVolts} V or less, AC and DC. Prove the tester again.`],
      contact: 'probe',
      exits: exits(['in', 'falling', 'high', 'not-sure', 'cannot']),
    },
    {
      ...common,
      id: '~put-back',
      kind: 'do',
      title: 'Put back what an earlier run has left',
      lines: ['Each of these was left fitted or lifted.', 'Put it back, or take it out, as the machine was built.'],
      contact: 'hands',
      exits: exits(['done', 'not-sure', 'cannot']),
    },
    {
      ...common,
      id: '~take-out',
      kind: 'do',
      title: 'Take out what was put in',
      lines: ['Count each thing out of the machine.', 'What cannot come out stays named on the machine.'],
      contact: 'hands',
      exits: exits(['done', 'not-sure', 'cannot']),
    },
    {
      ...common,
      id: '~read-back',
      kind: 'do',
      title: 'Read back what is on and what is in',
      lines: ['The record says what is connected and what is fitted.', 'Look at each with your own eyes and touch it: is it so?', 'What is not so ends this run as stopped.'],
      contact: 'hands',
      exits: exits(['done', 'not-sure', 'cannot']),
    },
    {
      ...common,
      id: '~choose',
      kind: 'observe',
      title: 'Safe: every source out, proved dead',
      lines: ['Go on from a place that still holds, or close this run as stopped.'],
      contact: 'none',
      asks: 'How does it go on?',
      exits: exits(['not-sure', 'cannot']),
    },
  ];
}
