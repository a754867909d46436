import { exact, type Exact } from '../../money/exact.ts';

export interface SpecificLimit {
  /** Percent by weight, at or above. */
  from: Exact;
  skin: 1 | 2 | null;
  eye: 1 | 2 | null;
}

export interface SubstanceLimits {
  /** The gravest first. */
  limits: readonly SpecificLimit[];
  source: string;
}

const MEMORY = 'EU CLP Annex VI, from memory: check the data sheet';

/** A corrosive limit is skin 1 and eye 1, an irritant one skin 2 and eye 2. */
function limits(corrosiveFrom: number, irritantFrom: string | null, source: string): SubstanceLimits {
  const corrosive: SpecificLimit = { from: exact(corrosiveFrom), skin: 1, eye: 1 };
  return {
    limits: irritantFrom === null ? [corrosive] : [corrosive, { from: exact(irritantFrom), skin: 2, eye: 2 }],
    source,
  };
}

/**
 * Limits of single substances, stricter or milder than the generic ones. They are EU values: used here to warn, never to
 * lower a class.
 */
export const SPECIFIC_LIMITS: Readonly<Record<string, SubstanceLimits>> = {
  'hydrofluoric acid': {
    limits: [
      { from: exact(1), skin: 1, eye: 1 },
      { from: exact('0.1'), skin: null, eye: 2 },
    ],
    source: 'German hazardous-substance database, quoting EU CLP Annex VI; the eye line from memory',
  },
  'sodium hydroxide': limits(2, '0.5', 'industry leaflet on sodium hydroxide, EU CLP Annex VI values'),
  'acetic acid': limits(25, '10', 'software help page quoting EU CLP Annex VI'),
  'ammonium bifluoride': limits(1, '0.1', MEMORY),
  'potassium hydroxide': limits(2, '0.5', MEMORY),
  'phosphoric acid': limits(25, '10', MEMORY),
  'hydrochloric acid': limits(25, '10', MEMORY),
  'sulfuric acid': limits(15, '5', MEMORY),
};

/** The class that a substance's own limits give at a percentage; null where there are none or it stays below them. */
export function specificClass(substance: string, percent: Exact): SpecificLimit | null {
  const name = substance.trim().toLowerCase();
  const own = Object.hasOwn(SPECIFIC_LIMITS, name) ? SPECIFIC_LIMITS[name] : undefined;
  return own?.limits.find(({ from }) => percent.gte(from)) ?? null;
}
