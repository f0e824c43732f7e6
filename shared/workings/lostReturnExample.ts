/** An invented three-rail supply for the first look at the lost-return sheet and for its page. */
import type { z } from 'zod';

import type { lostReturnInputs } from '@/shared/workings/lostReturnInputs';

/** One cage, two returns: R1 carries the backplane, R2 the line cage. */
export const lostReturnExample: z.input<typeof lostReturnInputs> = {
  rails: [
    { name: '+5 V', volts: 5, limitAmps: 24, shortedAmps: 5 },
    { name: '+12 V', volts: 12, limitAmps: 3 },
    { name: '−12 V', volts: -12, limitAmps: 9 },
  ],
  returns: [
    { name: 'R1', from: '0 V', to: 'backplane', squareMillimetres: 6, metres: 0.5 },
    { name: 'R2', from: '0 V', to: 'line cage', squareMillimetres: 1.5, metres: 0.8 },
  ],
  feeds: [
    { name: 'F1', from: '+5 V', to: '+5 V backplane', squareMillimetres: 6, metres: 0.5 },
    { name: 'F2', from: '+5 V', to: '+5 V line cage', squareMillimetres: 1.5, metres: 0.8 },
    { name: 'F3', from: '+12 V', to: '+12 V line cage', squareMillimetres: 1, metres: 0.8 },
    { name: 'F4', from: '−12 V', to: '−12 V line cage', squareMillimetres: 1, metres: 0.8 },
  ],
  loads: [
    { name: 'Processor', from: '+5 V backplane', to: 'backplane', amps: 8 },
    { name: 'Line board', from: '+5 V line cage', to: 'line cage', amps: 6 },
    { name: 'Line board', from: '+12 V line cage', to: 'line cage', amps: 0.4 },
    { name: 'Line board', from: '−12 V line cage', to: 'line cage', amps: 0.8 },
  ],
  diodes: [
    { name: 'D7', part: 'freewheel', anode: '0 V', cathode: '+5 V', ratedAmps: 6 },
    { name: 'D8', part: 'clamp', anode: '0 V', cathode: '+12 V', ratedAmps: 3 },
    { name: 'D9', part: 'clamp', anode: '−12 V', cathode: '0 V', ratedAmps: 3 },
  ],
};
