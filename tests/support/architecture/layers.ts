import { type Edge } from './import-graph.ts';

/**
 * Features in their order: each may use those on lines above it. Features on one line do not know each other.
 */
const FEATURE_ORDER: readonly (readonly string[])[] = [
  ['accounts'],
  ['workshops'],
  ['builds'],
  ['parts'],
  ['files'],
  ['orders', 'diary', 'footage', 'worksheets'],
  ['notes'],
  ['episodes'],
  ['captions', 'plans'],
  ['questions'],
  ['audience'],
];

/** Where a source file lives, as far as the rules care. */
export interface Place {
  readonly layer: string;
  readonly feature?: string;
}

const PROCESSES = /^src\/(web|worker|middleware|env\.d|process-[a-z-]+|development-[a-z-]+)\.ts$/;
const FEATURE_FILE =
  /^src\/features\/([a-z-]+)\/(?:(server|components)\/.+|(emails|jobs|queries)\.ts|[^/]+)$/;
const FOLDER =
  /^(?:src\/)?(pages|layouts|components|styles|domain|db|server|client|cli|seed|fake-s3|fake-smtp|scripts|tests)\//;

/** Where a file lives. @throws Error for one that stands where ARCHITECTURE.md has nothing */
export function placeOf(file: string): Place {
  if (PROCESSES.test(file)) return { layer: 'process' };
  if (file === 'src/paths.ts') return { layer: 'paths' };
  const [, feature, folder, special] = FEATURE_FILE.exec(file) ?? [];
  if (feature !== undefined) return { layer: `feature ${folder ?? special ?? 'words'}`, feature };
  const [, layer] = FOLDER.exec(file) ?? [];
  if (layer === undefined) throw new Error(`${file} stands in no folder of the layout.`);
  return { layer };
}

const FEATURES = [
  'feature words',
  'feature emails',
  'feature jobs',
  'feature queries',
  'feature components',
  'feature server',
];
const BELOW = [...FEATURES, 'layouts', 'components', 'client', 'server', 'db', 'domain', 'paths'];

/** What each layer may import besides packages. paths.ts is a leaf that everything may use. */
const MAY_IMPORT: Readonly<Record<string, readonly string[]>> = {
  pages: BELOW,
  process: ['process', ...BELOW],
  seed: ['seed', 'process', ...BELOW],
  cli: ['cli', ...BELOW],
  layouts: ['layouts', 'components', 'client', 'styles', 'domain', 'paths'],
  components: ['components'],
  styles: ['styles'],
  'feature components': ['feature components', 'feature queries', 'feature words', 'components', 'client'],
  'feature queries': ['feature words', 'client'],
  'feature server': ['feature server', 'feature words', 'feature emails', 'server', 'db'],
  'feature jobs': ['feature server', 'feature words', 'server'],
  'feature emails': ['feature words'],
  'feature words': ['feature words'],
  server: ['server', 'db', 'domain', 'paths'],
  client: ['client', 'domain', 'paths'],
  db: ['db', 'domain'],
  domain: ['domain'],
  paths: [],
  'fake-s3': ['fake-s3'],
  'fake-smtp': ['fake-smtp'],
};

/** Of another feature, on a line above, only its words and what its server folder gives. */
const OF_OTHERS = ['feature words', 'feature server'];

function rankOf(feature: string): number {
  const rank = FEATURE_ORDER.findIndex((line) => line.includes(feature));
  if (rank === -1) throw new Error(`The feature ${feature} has no place in the order of features.`);
  return rank;
}

/** Why an import of ours may not be, or null when it may. */
export function refusalOf(edge: Edge): string | null {
  const [from, to] = [placeOf(edge.from), placeOf(edge.to)];
  const allowed = MAY_IMPORT[from.layer];
  if (!allowed) return null;
  const shared = from.feature === undefined ? [] : ['domain', 'paths'];
  if (![...allowed, ...shared].includes(to.layer)) return `${from.layer} may not use ${to.layer}`;
  if (from.feature === undefined || to.feature === undefined || from.feature === to.feature) return null;
  if (rankOf(to.feature) >= rankOf(from.feature))
    return `${from.feature} may not use ${to.feature}: it is not to its left`;
  return OF_OTHERS.includes(to.layer) ? null : `the ${to.layer} of another feature is its own`;
}
