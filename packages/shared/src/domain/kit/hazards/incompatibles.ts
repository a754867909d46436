/** What a product is, as far as mixing goes. `unknown` is any product whose class nobody entered. */
export type MixClass =
  | 'acid'
  | 'oxidizing acid'
  | 'hydrofluoric acid'
  | 'base'
  | 'strong alkali'
  | 'hypochlorite'
  | 'ammonia'
  | 'sulfide'
  | 'cyanide'
  | 'oxidizer'
  | 'hydrogen peroxide'
  | 'flammable'
  | 'alcohol or acetone'
  | 'combustible'
  | 'activated carbon'
  | 'thioglycolate'
  | 'quaternary disinfectant'
  | 'anionic detergent'
  | 'metal'
  | 'bare metal'
  | 'bare aluminum'
  | 'unknown';

export type Severity = 'danger' | 'warning' | 'info';

export interface Incompatibility {
  id: string;
  a: readonly MixClass[];
  b: readonly MixClass[];
  severity: Severity;
  /** What happens, for a sentence. */
  result: string;
  source: string;
}

const LAB_LIST = 'academic laboratory incompatibility list';
const TAILGATE = 'state transport-assistance tailgate talk';
const MAGAZINE = 'laboratory-safety magazine, mixtures to avoid';
const MEMORY = 'general chemistry, from memory';
const PRACTICE = 'common practice, no source';

const ACIDS = ['acid', 'oxidizing acid', 'hydrofluoric acid'] as const;
const BASES = ['base', 'strong alkali', 'ammonia'] as const;
const FLAMMABLES = ['flammable', 'alcohol or acetone'] as const;
const ORGANICS = [...FLAMMABLES, 'combustible'] as const;
const BARE_METALS = ['bare metal', 'bare aluminum'] as const;

/** Pairs that are kept apart on a shelf, in a waste bucket and one after another on a panel. */
export const INCOMPATIBILITIES: readonly Incompatibility[] = [
  pair('acid-hypochlorite', ACIDS, ['hypochlorite'], 'danger', 'chlorine gas', `${MAGAZINE}; ${TAILGATE}; ${LAB_LIST}`),
  pair('ammonia-hypochlorite', ['ammonia'], ['hypochlorite'], 'danger', 'chloramine gases', `${TAILGATE}; ${LAB_LIST}`),
  pair('acid-sulfide', ACIDS, ['sulfide'], 'danger', 'hydrogen sulfide gas', MAGAZINE),
  pair('acid-cyanide', ACIDS, ['cyanide'], 'danger', 'hydrogen cyanide gas', `${MAGAZINE}; ${LAB_LIST}`),
  pair('oxidizing-acid-combustible', ['oxidizing acid'], ORGANICS, 'danger', 'fire', MAGAZINE),
  pair('oxidizer-solvent', ['oxidizer'], FLAMMABLES, 'danger', 'fire or violent reaction', `${MAGAZINE}; ${LAB_LIST}`),
  pair(
    'peroxide-organics',
    ['hydrogen peroxide'],
    [...ORGANICS, 'metal', ...BARE_METALS],
    'danger',
    'fire, violent decomposition',
    LAB_LIST,
  ),
  pair('hypochlorite-acids-carbon', ['hypochlorite'], ['activated carbon'], 'danger', 'gas or fire', LAB_LIST),
  pair(
    'hypochlorite-peroxide',
    ['hypochlorite'],
    ['hydrogen peroxide'],
    'warning',
    'do not mix (rapid oxygen release)',
    'public health warnings about bleach mixtures; the reaction from memory',
  ),
  pair('hypochlorite-alcohol', ['hypochlorite'], ['alcohol or acetone'], 'danger', 'toxic chlorinated vapors', MEMORY),
  pair(
    'hf-ammonia',
    ['hydrofluoric acid'],
    ['ammonia'],
    'warning',
    'violent neutralisation, fumes',
    `${LAB_LIST}; the result from memory`,
  ),
  pair(
    'acid-base',
    ACIDS,
    BASES,
    'warning',
    'heat, spatter; neutralises both products',
    'university chemical-storage slides',
  ),
  pair(
    'hf-metal',
    ['hydrofluoric acid'],
    ['metal', ...BARE_METALS],
    'warning',
    'slowly releases hydrogen gas',
    'hydrofluoric acid safety data sheet',
  ),
  pair(
    'alkali-aluminum',
    ['strong alkali'],
    ['bare aluminum'],
    'warning',
    'hydrogen gas, etching and staining',
    MEMORY,
  ),
  pair('acid-baremetal', ACIDS, BARE_METALS, 'warning', 'etching, dulling', PRACTICE),
  pair(
    'thiol-acid',
    ['thioglycolate'],
    [...ACIDS, 'hypochlorite'],
    'warning',
    'foul or toxic sulfur gases; do not mix or follow without a rinse',
    PRACTICE,
  ),
  pair('quat-anionic', ['quaternary disinfectant'], ['anionic detergent'], 'info', 'each cancels the other', PRACTICE),
];

/** The rule for a product of unknown class: public warnings (poison centers, state pages). */
export const NEVER_MIX: Incompatibility = pair(
  'never-mix',
  ['unknown'],
  ['unknown'],
  'info',
  'do not mix products or refill a bottle over another product’s remains',
  'public warnings (poison centers, state pages)',
);

const BY_SEVERITY: readonly Severity[] = ['danger', 'warning', 'info'];

/**
 * What speaks against two products together, the gravest first. The order of the two makes no difference; a product without
 * a known class is not mixed with anything.
 */
export function incompatible(first: readonly MixClass[], second: readonly MixClass[]): Incompatibility[] {
  const isUnknown = [first, second].some((classes) => classes.length === 0 || classes.includes('unknown'));
  const found = INCOMPATIBILITIES.filter(
    ({ a, b }) => (meets(a, first) && meets(b, second)) || (meets(a, second) && meets(b, first)),
  );
  return [...found, ...(isUnknown ? [NEVER_MIX] : [])].sort(
    (x, y) => BY_SEVERITY.indexOf(x.severity) - BY_SEVERITY.indexOf(y.severity),
  );
}

function meets(rule: readonly MixClass[], product: readonly MixClass[]): boolean {
  return product.some((mixClass) => rule.includes(mixClass));
}

function pair(
  id: string,
  a: readonly MixClass[],
  b: readonly MixClass[],
  severity: Severity,
  result: string,
  source: string,
): Incompatibility {
  return { id, a, b, severity, result, source };
}
