import type { Circuit } from '@/shared/workings/plot';

/** +5 V and −12 V with a board each; return R2 is open, and the −12 V rail pulls +5 V down through its freewheel diode. */
export const lostReturnCircuit: Circuit = {
  title: 'With R2 opened',
  nodes: [
    { id: 'p5', label: '+5 V', volts: -0.71, side: 'supply', trouble: 'reversed' },
    { id: 'zero', label: '0 V', volts: 0, side: 'supply' },
    { id: 'n12', label: '−12 V', volts: -11.6, side: 'supply' },
    { id: 'p5l', label: '+5 V board', volts: -0.75, side: 'load' },
    { id: 'zerol', label: '0 V board', volts: -1.4, side: 'load', trouble: 'off its place' },
    { id: 'n12l', label: '−12 V board', volts: -11.4, side: 'load' },
  ],
  branches: [
    { id: 's5', kind: 'source', label: '+5 V rail', from: 'p5', to: 'zero', amps: 0, trouble: 'off' },
    { id: 's12', kind: 'source', label: '−12 V rail', from: 'zero', to: 'n12', amps: -9.1, lit: true, trouble: 'in limit' },
    { id: 'd5', kind: 'diode', label: 'Freewheel D3', from: 'zero', to: 'p5', amps: 9.1, lit: true, trouble: '3 times its rating' },
    { id: 'f5', kind: 'conductor', label: 'Feed F1', from: 'p5', to: 'p5l', amps: 9.1, lit: true },
    { id: 'r1', kind: 'conductor', label: 'Return R1', from: 'zerol', to: 'zero', amps: 0.2 },
    { id: 'r2', kind: 'conductor', label: 'Return R2', from: 'zerol', to: 'zero', amps: 0, mark: 'opened' },
    { id: 'f12', kind: 'conductor', label: 'Feed F2', from: 'n12', to: 'n12l', amps: -9.1, lit: true },
    { id: 'l5', kind: 'load', label: 'CPU board', from: 'p5l', to: 'zerol', amps: 9.1, lit: true },
    { id: 'l12', kind: 'load', label: 'Memory board', from: 'zerol', to: 'n12l', amps: 9.1, lit: true },
  ],
  words: 'R2 is open. The current of the −12 V rail comes back through the freewheel diode of +5 V at 9.1 A, and +5 V stands at −0.71 V.',
};
