/** Symbols of a circuit on a line of 34 pixels from left to right, after the drawings of IEC 60617. Pure. */
import type { CircuitKind } from '@/shared/workings/plot';

export interface CircuitSymbol {
  /** stroked */
  line: string;
  /** filled with the colour of the paper and stroked */
  body?: string;
  /** filled with ink */
  solid?: string;
}

export const SYMBOL_LENGTH = 34;

/** Every kind; a plain conductor has no symbol but its line. */
export const CIRCUIT_SYMBOLS: Readonly<Record<CircuitKind, CircuitSymbol>> = {
  source: { line: 'M0 0H6M28 0H34', body: 'M17 -11a11 11 0 1 0 .01 0z' },
  conductor: { line: 'M0 0H34' },
  load: { line: 'M0 0H2M32 0H34', body: 'M2 -8H32V8H2z' },
  resistor: { line: 'M0 0H3M31 0H34', body: 'M3 -6H31V6H3z' },
  diode: { line: 'M0 0H8M26 0H34M26 -10V10', solid: 'M8 -10V10L26 0z' },
  lamp: { line: 'M0 0H6M28 0H34M9.2 -7.8 24.8 7.8M9.2 7.8 24.8 -7.8', body: 'M17 -11a11 11 0 1 0 .01 0z' },
  capacitor: { line: 'M0 0H13M21 0H34M13 -11V11M21 -11V11' },
  inductor: { line: 'M0 0H3a3.5 4.5 0 0 1 7 0a3.5 4.5 0 0 1 7 0a3.5 4.5 0 0 1 7 0a3.5 4.5 0 0 1 7 0H34' },
  fuse: { line: 'M0 0H34', body: 'M4 -6H30V6H4z' },
  switch: { line: 'M0 0H7M27 0H34M7 0 26 -10' },
};

/** What a symbol is called in the key. */
export const CIRCUIT_KIND_WORDS: Readonly<Record<CircuitKind, string>> = {
  source: 'rail',
  conductor: 'wire',
  load: 'load',
  resistor: 'resistor',
  diode: 'diode',
  lamp: 'lamp',
  capacitor: 'capacitor',
  inductor: 'choke',
  fuse: 'fuse',
  switch: 'switch',
};
