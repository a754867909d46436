import { describe, expect, it } from 'vitest';
import { exact } from '../../money/exact.ts';
import ghs from '../testing/published-ghs.json' with { type: 'json' };
import published from '../testing/published-hazards.json' with { type: 'json' };
import { expectPublished, named, type PublishedRow } from '../testing/published-rows.ts';
import { GHS_PRECAUTIONS } from './ghs-precautions.ts';
import { GHS_STATEMENTS } from './ghs-statements.ts';
import { INCOMPATIBILITIES, incompatible, NEVER_MIX, type MixClass } from './incompatibles.ts';
import { needsLabel, WORKPLACE_LABEL } from './label-duty.ts';
import { ghsNumber, ghsStatement, labelElements, PICTOGRAMS } from './label-elements.ts';
import { classOfMixture, reachesLimit } from './mixture-class.ts';
import { specificClass } from './specific-limits.ts';

const rows: readonly PublishedRow[] = ghs;
const ofKind = (kind: string) => rows.filter((row) => row.inputs.kind === kind);

describe('hazard statements, word for word', () => {
  it.each(named(ofKind('H')))('%s', (_name, row) => {
    const statement = ghsStatement(String(row.inputs.code));
    if (!statement) throw new Error('The statement is missing.');
    const { text, signalWord, pictogram, precautions } = statement;
    expectPublished(
      {
        text,
        signalWord: signalWord ?? 'none',
        pictogram: pictogram ?? 'none',
        ghsPictogram: pictogram ? ghsNumber(pictogram) : 'none',
        mainPrecautionary: precautions,
      },
      row,
    );
  });

  it.each(named(ofKind('P')))('%s', (_name, row) => {
    expect(GHS_PRECAUTIONS.find(({ code }) => code === row.inputs.code)?.text).toBe(row.expected.text);
  });

  it('has the words of every precaution it names, each code once', () => {
    const known = GHS_PRECAUTIONS.map(({ code }) => code);
    expect(new Set(known).size).toBe(known.length);
    for (const { precautions } of GHS_STATEMENTS) expect(known).toEqual(expect.arrayContaining([...precautions]));
  });
});

describe('what a label shows', () => {
  it.each(named(ofKind('precedence')))('%s', (_name, row) => {
    const { signalWord, pictograms } = labelElements(row.inputs.statements as string[]);
    expectPublished({ signalWord: signalWord ?? 'none', pictograms }, row);
  });

  it('numbers the pictograms as the UN annex does (from memory)', () => {
    const [row] = ofKind('pictogram');
    const { eight } = row?.expected as { eight: { ghs: string; name: string }[] };
    expect(PICTOGRAMS.slice(0, 8).map((name) => ({ ghs: ghsNumber(name), name }))).toEqual(eight);
  });

  it('counts doubles once and hands back what it does not know', () => {
    const label = labelElements(['h315', 'H315', 'H999']);
    expect(label.statements.map(({ code }) => code)).toEqual(['H315']);
    expect(label.unknown).toEqual(['H999']);
  });

  it.each(named(rows.filter((row) => row.id.startsWith('label-case'))))('%s', (_name, row) => {
    const use = row.inputs as unknown as Parameters<typeof needsLabel>[0];
    expectPublished({ labelRequired: needsLabel(use) }, row);
  });

  it('names the parts of a workplace label (29 CFR 1910.1200(f)(6))', () => {
    const row = rows.find(({ id }) => id === 'label-workplace');
    expect({ eitherA: WORKPLACE_LABEL.full, orB: WORKPLACE_LABEL.general }).toEqual(row?.expected);
  });
});

describe('products that stay apart', () => {
  it.each(named(published.incompatibles))('%s', (_name, row) => {
    const known = [...INCOMPATIBILITIES, NEVER_MIX].find(({ id }) => id === row.id);
    expectPublished({ severity: known?.severity, result: known?.result.replace('’', "'") }, row);
  });

  it('makes no difference between one order and the other', () => {
    const classes = [...new Set(INCOMPATIBILITIES.flatMap(({ a, b }) => [...a, ...b]))];
    for (const one of classes) for (const other of classes) expect(ids([one], [other])).toEqual(ids([other], [one]));
  });

  it('puts the gravest first', () => {
    expect(ids(['acid', 'quaternary disinfectant'], ['anionic detergent', 'base', 'hypochlorite'])).toEqual([
      'acid-hypochlorite',
      'acid-base',
      'quat-anionic',
    ]);
  });

  it('mixes nothing with a product of unknown class', () => {
    expect(ids([], ['base'])).toEqual(['never-mix']);
    expect(ids(['unknown'], ['acid'])).toEqual(['never-mix']);
    expect(ids(['base'], ['base'])).toEqual([]);
  });

  it('counts every acid as an acid', () => {
    for (const acid of ['acid', 'oxidizing acid', 'hydrofluoric acid'] as const)
      expect(ids([acid], ['hypochlorite'])).toContain('acid-hypochlorite');
  });
});

describe('limits of a mixture', () => {
  const corrosive = { skin: 1, eye: 1 } as const;

  it('counts an ingredient that is skin 1 and eye 1 once (Table A.3.3 footnote a, from memory)', () => {
    expect(classOfMixture([{ percent: exact('2.9'), ...corrosive }]).eye).toBe(2);
  });

  it.each([
    ['hydrofluoric acid', '1', 1],
    ['Sodium hydroxide', '2', 1],
    ['sodium hydroxide', '0.5', 2],
    ['ammonium bifluoride', '0.1', 2],
    ['potassium hydroxide', '5', 1],
    ['sulfuric acid', '15', 1],
    ['phosphoric acid', '24.9', 2],
  ])('%s at %s %% is skin %s by its own limits (EU CLP Annex VI)', (substance, percent, skin) => {
    expect(specificClass(substance, exact(percent))?.skin).toBe(skin);
    expect(classOfMixture([{ percent: exact(percent), skin: null, eye: null, substance }]).skin).toBe(skin);
  });

  it('warns by a stricter limit of a substance and never lowers a class by a milder one', () => {
    expect(classOfMixture([{ percent: exact(6), ...corrosive, substance: 'acetic acid' }]).skin).toBe(1);
    expect(specificClass('toString', exact(6))).toBeNull();
  });

  it.each([
    ['Skin sensitization 1', '0.1', true],
    ['Skin sensitization 1A', '0.099', false],
    ['Skin sensitization 1B', '0.99', false],
    ['Respiratory sensitization 1B', '1', true],
    ['STOT SE 3', '19.9', false],
    ['STOT RE 2', '1', true],
    ['Carcinogenicity 2', '0.1', true],
    ['Mutagenicity 2', '0.5', false],
    ['Reproductive toxicity 1', '0.1', true],
  ] as const)('%s at %s %%: %s (29 CFR 1910.1200 App. A)', (hazard, percent, reaches) => {
    expect(reachesLimit(hazard, exact(percent))).toBe(reaches);
  });

  it('lets better data overrule an extreme pH', () => {
    expect(classOfMixture([], 13)).toEqual({ skin: 1, eye: 1 });
    expect(classOfMixture([], 13, true)).toEqual({ skin: null, eye: null });
  });
});

function ids(first: readonly MixClass[], second: readonly MixClass[]): string[] {
  return incompatible(first, second).map(({ id }) => id);
}
