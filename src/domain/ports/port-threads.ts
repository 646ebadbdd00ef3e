import Fraction from 'fraction.js';

/** The families of threads that hydraulic and pipe ports have. */
export type PortFamily = 'G' | 'R' | 'NPT' | 'JIC' | 'ORB' | 'ORFS' | 'metric';

/** One thread, with what a caliper can meet on it. Millimetres. */
export interface PortThread {
  readonly family: PortFamily;
  /** As the trade writes it: G 3/8, 3/8 NPT, 9/16-18 (JIC 6), M18x1.5. */
  readonly name: string;
  /** Largest diameter of the external thread: of a tapered one at its gauge plane (R) or of the pipe (NPT). */
  readonly major: number;
  /** From the small end to the large one, what a caliper meets on the external thread. */
  readonly external: readonly [least: number, most: number];
  /** What it meets across the crests of the internal thread. */
  readonly internal: readonly [least: number, most: number];
  readonly pitch: number;
  /** As it is counted: 19 tpi, 1.5 mm. */
  readonly pitchName: string;
}

/** What holds for all threads of a family. */
export interface FamilyFacts {
  readonly standard: string;
  readonly angle: 55 | 60;
  readonly tapered: boolean;
  readonly seals: string;
  readonly mates: string;
}

export const FAMILIES: Readonly<Record<PortFamily, FamilyFacts>> = {
  G: {
    standard: 'ISO 228-1',
    angle: 55,
    tapered: false,
    seals: 'On the face, with a bonded washer, ring or copper; never on the thread, so no tape.',
    mates: 'G of the same size with a flat face for the washer.',
  },
  R: {
    standard: 'ISO 7-1',
    angle: 55,
    tapered: true,
    seals: 'On the thread, with sealant.',
    mates: 'Rc or Rp of the same size.',
  },
  NPT: {
    standard: 'ASME B1.20.1',
    angle: 60,
    tapered: true,
    seals: 'On the thread, with sealant.',
    mates: 'NPT of the same size.',
  },
  JIC: {
    standard: 'SAE J514, ISO 8434-2',
    angle: 60,
    tapered: false,
    seals: 'On its 37° cone, metal to metal.',
    mates: 'JIC 37° of the same size. A 45° flare has some of the same threads and does not seal with it.',
  },
  ORB: {
    standard: 'SAE J1926-1, ISO 11926-1',
    angle: 60,
    tapered: false,
    seals: 'With an O-ring in the chamfer of the port.',
    mates: 'An O-ring boss stud of the same size.',
  },
  ORFS: {
    standard: 'SAE J1453, ISO 8434-3',
    angle: 60,
    tapered: false,
    seals: 'With an O-ring in the flat face of the fitting.',
    mates: 'A face-seal fitting of the same size.',
  },
  metric: {
    standard: 'ISO 6149-1; ISO 9974-1 with a flat face',
    angle: 60,
    tapered: false,
    seals: 'With an O-ring in the chamfer (ISO 6149) or a washer on the face (ISO 9974).',
    mates: 'The same thread with the same way of sealing.',
  },
};

/** How far a parallel external thread may lie below its nominal, and an internal crest above: tolerance and wear. */
const [UNDER, OVER] = [0.45, 0.6];
/** How far a caliper may read the other way. */
const READING = 0.06;

const mm = (inches: number) => inches * 25.4;

/** ISO 228-1:2000, table 1: size, threads an inch, major and minor diameter, mm. */
const G_SIZES: readonly (readonly [string, number, number, number])[] = [
  ['1/16', 28, 7.723, 6.561],
  ['1/8', 28, 9.728, 8.566],
  ['1/4', 19, 13.157, 11.445],
  ['3/8', 19, 16.662, 14.95],
  ['1/2', 14, 20.955, 18.631],
  ['5/8', 14, 22.911, 20.587],
  ['3/4', 14, 26.441, 24.117],
  ['1', 11, 33.249, 30.291],
  ['1 1/4', 11, 41.91, 38.952],
  ['1 1/2', 11, 47.803, 44.845],
  ['2', 11, 59.614, 56.656],
];

/** Gauge lengths, mm: ISO 7-1:1994, table 1. The other sizes of a taper thread are those of ISO 228-1. From memory. */
const R_GAUGE_LENGTHS: Readonly<Record<string, number>> = {
  '1/16': 4,
  '1/8': 4,
  '1/4': 6,
  '3/8': 6.4,
  '1/2': 8.2,
  '3/4': 9.5,
  '1': 10.4,
  '1 1/4': 12.7,
  '1 1/2': 12.7,
  '2': 15.9,
};
/** Both taper pipe threads taper 1 in 16 on diameter: ISO 7-1; ASME B1.20.1. */
const TAPER = 16;

/** ASME B1.20.1-2013, table 2: size, outside diameter of the pipe, in; threads an inch; hand engagement L1, in. From memory. */
const NPT_SIZES: readonly (readonly [string, number, number, number])[] = [
  ['1/16', 0.3125, 27, 0.16],
  ['1/8', 0.405, 27, 0.1615],
  ['1/4', 0.54, 18, 0.2278],
  ['3/8', 0.675, 18, 0.24],
  ['1/2', 0.84, 14, 0.32],
  ['3/4', 1.05, 14, 0.339],
  ['1', 1.315, 11.5, 0.4],
  ['1 1/4', 1.66, 11.5, 0.42],
  ['1 1/2', 1.9, 11.5, 0.42],
  ['2', 2.375, 11.5, 0.436],
];

/** SAE J514 and J1926-1: dash size, thread. Both families have the same threads. From memory. */
const SAE_SIZES: readonly (readonly [dash: number, size: string, tpi: number])[] = [
  [2, '5/16', 24],
  [3, '3/8', 24],
  [4, '7/16', 20],
  [5, '1/2', 20],
  [6, '9/16', 18],
  [8, '3/4', 16],
  [10, '7/8', 14],
  [12, '1 1/16', 12],
  [14, '1 3/16', 12],
  [16, '1 5/16', 12],
  [20, '1 5/8', 12],
  [24, '1 7/8', 12],
  [32, '2 1/2', 12],
];

/** SAE J1453: dash size, thread. From memory. */
const ORFS_SIZES: typeof SAE_SIZES = [
  [4, '9/16', 18],
  [6, '11/16', 16],
  [8, '13/16', 16],
  [10, '1', 14],
  [12, '1 3/16', 12],
  [16, '1 7/16', 12],
  [20, '1 11/16', 12],
  [24, '2', 12],
];

/** ISO 6149-1, table 1, and ISO 9974-1: diameter and pitch, mm. From memory. */
const METRIC_SIZES: readonly (readonly [number, number])[] = [
  [8, 1],
  [10, 1],
  [12, 1.5],
  [14, 1.5],
  [16, 1.5],
  [18, 1.5],
  [20, 1.5],
  [22, 1.5],
  [26, 1.5],
  [27, 2],
  [30, 2],
  [33, 2],
  [36, 2],
  [42, 2],
  [45, 2],
  [48, 2],
  [52, 2],
  [60, 2],
];

const parallel = (major: number, minor: number): Pick<PortThread, 'external' | 'internal'> => ({
  external: [major - UNDER, major + READING],
  internal: [minor - READING, minor + OVER],
});

/** Crest of an internal thread of 60°, 5/8 of the triangle's height either side: ISO 68-1; ASME B1.1. */
const minorOf = (major: number, pitch: number) => major - 1.082532 * pitch;

function gThread([size, tpi, major, minor]: (typeof G_SIZES)[number]): PortThread {
  return {
    family: 'G',
    name: `G ${size}`,
    major,
    ...parallel(major, minor),
    pitch: mm(1) / tpi,
    pitchName: `${String(tpi)} tpi`,
  };
}

function rThread([size, tpi, major, minor]: (typeof G_SIZES)[number]): readonly PortThread[] {
  const gauge = R_GAUGE_LENGTHS[size];
  if (gauge === undefined) return [];
  const along = gauge / TAPER;
  return [
    {
      family: 'R',
      name: `R ${size}`,
      major,
      // From the small end to a few turns past the gauge plane.
      external: [major - along - READING, major + along],
      internal: [minor - along - READING, minor + READING],
      pitch: mm(1) / tpi,
      pitchName: `${String(tpi)} tpi`,
    },
  ];
}

/** ASME B1.20.1: pitch diameter at the small end E0 = D − (0.05 D + 1.1) p, at the hand-tight plane E1 = E0 + L1/16. */
function nptThread([size, outside, tpi, engagement]: (typeof NPT_SIZES)[number]): PortThread {
  const pitch = 1 / tpi;
  const small = outside - (0.05 * outside + 1.1) * pitch;
  const height = 0.8 * pitch;
  return {
    family: 'NPT',
    name: `${size} NPT`,
    major: mm(outside),
    external: [mm(small + height) - READING, mm(outside) + READING],
    internal: [mm(small - height) - READING, mm(small + engagement / TAPER - height) + 0.2],
    pitch: mm(pitch),
    pitchName: `${String(tpi)} tpi`,
  };
}

function saeThread(
  family: 'JIC' | 'ORB' | 'ORFS',
  [dash, size, tpi]: (typeof SAE_SIZES)[number],
): PortThread {
  const major = mm(new Fraction(size).valueOf());
  const pitch = mm(1) / tpi;
  return {
    family,
    name: `${size}-${String(tpi)} (${family} ${String(dash)})`,
    major,
    ...parallel(major, minorOf(major, pitch)),
    pitch,
    pitchName: `${String(tpi)} tpi`,
  };
}

function metricThread([major, pitch]: (typeof METRIC_SIZES)[number]): PortThread {
  return {
    family: 'metric',
    name: `M${String(major)}x${String(pitch)}`,
    major,
    ...parallel(major, minorOf(major, pitch)),
    pitch,
    pitchName: `${String(pitch)} mm`,
  };
}

/** All the threads that are told apart here. */
export const PORT_THREADS: readonly PortThread[] = [
  ...G_SIZES.map(gThread),
  ...G_SIZES.flatMap(rThread),
  ...NPT_SIZES.map(nptThread),
  ...SAE_SIZES.map((size) => saeThread('JIC', size)),
  ...SAE_SIZES.map((size) => saeThread('ORB', size)),
  ...ORFS_SIZES.map((size) => saeThread('ORFS', size)),
  ...METRIC_SIZES.map(metricThread),
];
