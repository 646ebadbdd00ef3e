/** Coarse threads: diameter, pitch and usual tapping drill, mm. Pitches: ISO 261. Drills: makers' charts, which agree on these to 0.1. */
export const METRIC_COARSE: readonly (readonly [diameter: number, pitch: string, drill: string])[] = [
  [3, '0.5', '2.5'],
  [4, '0.7', '3.3'],
  [5, '0.8', '4.2'],
  [6, '1', '5'],
  [8, '1.25', '6.8'],
  [10, '1.5', '8.5'],
  [12, '1.75', '10.2'],
  [14, '2', '12'],
  [16, '2', '14'],
  [20, '2.5', '17.5'],
  [24, '3', '21'],
  [30, '3.5', '26.5'],
];

/** Clearance holes, mm: ISO 273. 14 and 30 mm, and the coarse one of 24 mm, from memory. */
export const CLEARANCE: Readonly<Record<number, readonly [fine: string, medium: string, coarse: string]>> = {
  3: ['3.2', '3.4', '3.6'],
  4: ['4.3', '4.5', '4.8'],
  5: ['5.3', '5.5', '5.8'],
  6: ['6.4', '6.6', '7'],
  8: ['8.4', '9', '10'],
  10: ['10.5', '11', '12'],
  12: ['13', '13.5', '14.5'],
  14: ['15', '15.5', '16.5'],
  16: ['17', '17.5', '18.5'],
  20: ['21', '22', '24'],
  24: ['25', '26', '28'],
  30: ['31', '33', '35'],
};

/** Inch coarse threads with their usual tapping drill: its name and inches. A maker's chart; ASME B1.1 for threads. */
export const UNIFIED_COARSE: Readonly<Record<string, readonly [name: string, inches: string]>> = {
  '#8-32': ['#29', '0.136'],
  '#10-24': ['#25', '0.1495'],
  '1/4-20': ['#7', '0.201'],
  '5/16-18': ['F', '0.257'],
  '3/8-16': ['5/16', '0.3125'],
  '7/16-14': ['U', '0.368'],
  '1/2-13': ['27/64', '0.421875'],
};

/** A split pin: its nominal size, which is the hole's, and its shank, mm. */
export interface SplitPin {
  readonly nominal: string;
  readonly shank: readonly [least: string, most: string];
  /** Bolts and clevis pins that it is for: over, up to and including. */
  readonly bolts: readonly [over: number, upTo: number];
  readonly clevisPins: readonly [over: number, upTo: number];
}

/** ISO 1234, table 1: from memory; the mean of each shank agrees with an open parts list made from the standard. */
export const SPLIT_PINS: readonly SplitPin[] = [
  { nominal: '1', shank: ['0.8', '0.9'], bolts: [3.5, 4.5], clevisPins: [3, 4] },
  { nominal: '1.6', shank: ['1.3', '1.4'], bolts: [5.5, 7], clevisPins: [5, 6] },
  { nominal: '2', shank: ['1.7', '1.8'], bolts: [7, 9], clevisPins: [6, 8] },
  { nominal: '2.5', shank: ['2.1', '2.3'], bolts: [9, 11], clevisPins: [8, 9] },
  { nominal: '3.2', shank: ['2.7', '2.9'], bolts: [11, 14], clevisPins: [9, 12] },
  { nominal: '4', shank: ['3.5', '3.7'], bolts: [14, 20], clevisPins: [12, 17] },
  { nominal: '5', shank: ['4.4', '4.6'], bolts: [20, 27], clevisPins: [17, 23] },
  { nominal: '6.3', shank: ['5.7', '5.9'], bolts: [27, 39], clevisPins: [23, 29] },
  { nominal: '8', shank: ['7.3', '7.5'], bolts: [39, 56], clevisPins: [29, 44] },
  { nominal: '10', shank: ['9.3', '9.5'], bolts: [56, 80], clevisPins: [44, 69] },
];
