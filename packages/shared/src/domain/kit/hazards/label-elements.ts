import { GHS_PRECAUTIONS } from './ghs-precautions.ts';
import { GHS_STATEMENTS } from './ghs-statements.ts';
import type { GhsPrecaution, GhsStatement, Pictogram, SignalWord } from './ghs.types.ts';

export interface LabelElements {
  signalWord: SignalWord | null;
  /** In the order of their GHS numbers, each once. */
  pictograms: Pictogram[];
  statements: readonly GhsStatement[];
  precautions: GhsPrecaution[];
  /** Codes not known here: their words are read from the data sheet. */
  unknown: string[];
}

const STATEMENTS: readonly GhsStatement[] = GHS_STATEMENTS;
const PRECAUTIONS: readonly GhsPrecaution[] = GHS_PRECAUTIONS;

/** Pictograms in the order of their numbers in the UN annex (from memory), GHS01 to GHS09. */
export const PICTOGRAMS: readonly Pictogram[] = [
  'Exploding bomb',
  'Flame',
  'Flame over circle',
  'Gas cylinder',
  'Corrosion',
  'Skull and crossbones',
  'Exclamation mark',
  'Health hazard',
  'Environment',
];

/** "GHS05" for the corrosion pictogram. */
export function ghsNumber(pictogram: Pictogram): string {
  return `GHS0${PICTOGRAMS.indexOf(pictogram) + 1}`;
}

export function ghsStatement(code: string): GhsStatement | undefined {
  return STATEMENTS.find((statement) => statement.code === code);
}

/**
 * What a label with these hazard statements shows: Danger silences Warning, and pictograms take precedence over one another
 * (29 CFR 1910.1200 Appendix C, C.2.1 and C.2.3.4).
 * @param codes such as H314; doubles count once
 */
export function labelElements(codes: readonly string[]): LabelElements {
  const wanted = [...new Set(codes.map((code) => code.trim().toUpperCase()))];
  const statements = wanted.flatMap((code) => ghsStatement(code) ?? []);
  const shown = new Set(statements.flatMap((statement) => keepsPictogram(statement, statements) ?? []));
  const precautionCodes = new Set(statements.flatMap((statement) => statement.precautions));
  return {
    signalWord: strongestWord(statements),
    pictograms: PICTOGRAMS.filter((pictogram) => shown.has(pictogram)),
    statements,
    precautions: PRECAUTIONS.filter((precaution) => precautionCodes.has(precaution.code)),
    unknown: wanted.filter((code) => ghsStatement(code) === undefined),
  };
}

function strongestWord(statements: readonly GhsStatement[]): SignalWord | null {
  if (statements.some((statement) => statement.signalWord === 'Danger')) return 'Danger';
  return statements.some((statement) => statement.signalWord === 'Warning') ? 'Warning' : null;
}

/** Null where a stronger pictogram on the label silences the statement's exclamation mark. */
function keepsPictogram(statement: GhsStatement, all: readonly GhsStatement[]): Pictogram | null {
  if (statement.pictogram !== 'Exclamation mark') return statement.pictogram;
  const has = (pictogram: Pictogram) => all.some((other) => other.pictogram === pictogram);
  const { hazard } = statement;
  const irritates = /^(Skin irritation|Eye irritation)/.test(hazard);
  const silenced =
    (hazard.startsWith('Acute toxicity') && has('Skull and crossbones')) ||
    (irritates && has('Corrosion')) ||
    ((irritates || hazard.startsWith('Skin sensitization')) &&
      all.some((other) => other.hazard.startsWith('Respiratory sensitization')));
  return silenced ? null : statement.pictogram;
}
