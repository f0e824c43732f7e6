/** Our own line drawings on a 24 × 24 grid; each is stroked, never filled, unless it names a filled part. */

export interface Drawing {
  stroke: string;
  fill?: string;
}

export const iconPaths = {
  // places
  bench: { stroke: 'M2 13h20M4 13v8M20 13v8M4 17h16M6 13V6h8v7M8.5 8.5h3M18 13V9' },
  trees: { stroke: 'M9 3h6v4H9zM12 7v4M5 15v-4h14v4M2.5 15h5v5h-5zM16.5 15h5v5h-5z' },
  machines: { stroke: 'M3 4h18v16H3zM3 14h18M6 7.5h6M6 10.5h6M16 8h2M6 17h3M15 17h3' },
  records: { stroke: 'M5 3h10l4 4v14H5zM15 3v4h4M8 11h8M8 14h8M8 17h5' },
  workings: { stroke: 'M4 3h16v18H4zM7.5 8h4M9.5 6v4M14 8h3M7 12.5h10M7.5 17h3M14 16h3M14 18.5h3' },
  workshop: { stroke: 'M3 10l9-6 9 6M5 9v11h14V9M9 20v-7h6v7' },
  // power
  'power-proved-dead': { stroke: 'M1.5 12H5M5 7h5.5v10H5zM10.5 9.5H14M10.5 14.5H14M18.5 6v12M18.5 12h4' },
  'power-off': {
    stroke: 'M2 15h6M16 15h6M8.5 14.5l8-7M8 13.4a1.6 1.6 0 100 3.2 1.6 1.6 0 000-3.2zM16 13.4a1.6 1.6 0 100 3.2 1.6 1.6 0 000-3.2z',
  },
  'power-lamp': { stroke: 'M12 2.5a6.5 6.5 0 100 13 6.5 6.5 0 000-13zM7.4 4.4l9.2 9.2M16.6 4.4l-9.2 9.2M9 18.5h6M9.5 21.5h5' },
  'power-bench': { stroke: 'M2.5 5h19v14h-19zM6 9h5v3.5H6zM14.5 10.7h4M16.5 8.7v4M14.5 16h4M6 16h5' },
  'power-mains': { stroke: 'M13.5 2 5.5 13.5h6L9.5 22l9-12h-6.5z', fill: 'M13.5 2 5.5 13.5h6L9.5 22l9-12h-6.5z' },
  'power-unknown': { stroke: 'M7.5 8a4.5 4.5 0 119 0c0 3.2-4.5 3.4-4.5 7.2M12 19v1.6' },
  // marks
  check: { stroke: 'M4 12.5 9.5 18 20 6.5' },
  cross: { stroke: 'M5 5l14 14M19 5L5 19' },
  close: { stroke: 'M3 10c3-4 6-4 9-1s6 3 9-1M3 17c3-4 6-4 9-1s6 3 9-1' },
  question: { stroke: 'M7.5 8a4.5 4.5 0 119 0c0 3.2-4.5 3.4-4.5 7.2M12 19v1.6' },
  exclaim: { stroke: 'M12 4v10M12 18.4V20' },
  none: { stroke: 'M5 12h14' },
  stop: { stroke: 'M8 2.5h8L21.5 8v8L16 21.5H8L2.5 16V8zM7.5 12h9' },
  // arrows
  right: { stroke: 'M4 12h15M13 5.5l6.5 6.5-6.5 6.5' },
  left: { stroke: 'M20 12H5M11 5.5 4.5 12l6.5 6.5' },
  up: { stroke: 'M12 20V5M5.5 11 12 4.5 18.5 11' },
  down: { stroke: 'M12 4v15M5.5 13l6.5 6.5 6.5-6.5' },
  unfold: { stroke: 'M4.5 8.5 12 16l7.5-7.5' },
  // things
  meter: { stroke: 'M5 2.5h14v19H5zM7.5 5h9v5h-9zM12 13.2a2.3 2.3 0 100 4.6 2.3 2.3 0 000-4.6zM12 13.2v2.3M8 19.5h.5M15.5 19.5h.5' },
  clock: { stroke: 'M12 3a9 9 0 100 18 9 9 0 000-18zM12 7v5.5l4 2' },
  camera: { stroke: 'M3 7h4l2-3h6l2 3h4v13H3zM12 9.5a3.7 3.7 0 100 7.4 3.7 3.7 0 000-7.4z' },
  person: { stroke: 'M12 3.5a4 4 0 100 8 4 4 0 000-8zM4 21v-3l3-3h10l3 3v3' },
  hold: { stroke: 'M4 20V4h16v16zM8 12l3 3 5.5-6' },
  pencil: { stroke: 'M4 20l1-5L16.5 3.5l4 4L9 19zM14 6l4 4' },
  plus: { stroke: 'M12 4v16M4 12h16' },
  unsent: { stroke: 'M12 20v-9M8 14.5l4-4 4 4M4 8V4h16v4M3 3l18 18' },
  sun: {
    stroke:
      'M12 7.5a4.5 4.5 0 100 9 4.5 4.5 0 000-9zM12 1.5v3M12 19.5v3M1.5 12h3M19.5 12h3M4.6 4.6l2 2M17.4 17.4l2 2M19.4 4.6l-2 2M6.6 17.4l-2 2',
  },
  moon: { stroke: 'M19.5 14.5A8.5 8.5 0 119.5 4.5a7 7 0 0010 10z' },
} as const satisfies Record<string, Drawing>;

export type IconName = keyof typeof iconPaths;
