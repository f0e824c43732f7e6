/** A Class II machine has no earth to prove: the step that proves one asks there whether that is so. */
import type { Profile } from '../document/profile';
import type { Step } from '../document/steps';

/** The step as this machine needs it: on Class II an earth step looks for the double square and for earth that should not be there. */
export function forClass(step: Step, profile: Profile): Step {
  if (step.kind !== 'prove-earth' || profile.mains.protectiveClass === 'I') return step;
  return {
    ...step,
    title: 'Class II: no earth to prove',
    lines: ['Find the double square on the plate.', 'Look at the lead: two wires and no earth.', 'Look for metal that a hand can reach and that is joined to an earth.'],
    expect: 'A double square, a two-wire lead, and no earth anywhere.',
    why: 'Class II relies on double insulation alone. Where an earth has been added, or the square is missing, the machine is not what its profile says.',
  };
}

/** How a Class II machine answers it: anything but a clean "so it is" counts as an earth that does not stand. */
export const NO_EARTH = {
  id: 'earth',
  label: 'Double square on the plate, two-wire lead, nothing earthed that a hand can reach',
  ask: 'word' as const,
  wait: null,
  words: [
    { word: 'in' as const, label: 'So it is', result: 'in' as const },
    { word: 'high' as const, label: 'Not so', result: 'high' as const },
    { word: 'not-sure' as const, label: 'Not sure', result: 'not-sure' as const },
    { word: 'cannot' as const, label: 'Cannot see', result: 'cannot' as const },
  ],
};
