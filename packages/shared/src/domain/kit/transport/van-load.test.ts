import { describe, expect, it } from 'vitest';
import { exact } from '../../money/exact.ts';
import { vanLoad, type VanPackage } from './van-load.ts';

/* The limits are those of 49 CFR 173.6(a); the published rows are run beside the other sections' in check/. */

function aPackage(fields: Partial<VanPackage> = {}): VanPackage {
  return {
    name: 'Degreaser jug',
    count: 1,
    grossKg: exact('4.2'),
    litres: exact('3.785'),
    hazardClass: '8',
    packingGroup: 'II',
    ...fields,
  };
}

describe('one package', () => {
  it.each([
    ['within the limit', {}, null],
    ['at the limit', { grossKg: exact(30), litres: exact(30) }, null],
    ['an 8-gallon can', { litres: exact('30.2833') }, /at most 30 kg and 30 L/],
    ['packing group I', { packingGroup: 'I' }, /at most 0.5 kg and 0.5 L/],
    ['a class that never counts', { hazardClass: '1' }, /can’t be a material of trade/],
    ['no weight', { grossKg: null }, /weigh it/],
    ['no packing group', { packingGroup: null }, /data sheet, section 14/],
    ['a heavy cylinder', { hazardClass: '2.2', isCylinder: true, grossKg: exact(101), packingGroup: null }, /100 kg/],
    ['a cylinder', { hazardClass: '2.2', isCylinder: true, grossKg: exact(100), packingGroup: null }, null],
    ['water-reactive', { hazardClass: '4.3', litres: exact('0.031') }, /30 mL/],
    ['water-reactive, group I', { hazardClass: '4.3', packingGroup: 'I' }, /group I can’t be/],
    ['diluted Class 9', { hazardClass: '9', concentrationPercent: exact(2), litres: exact(1500) }, null],
    ['too much of it', { hazardClass: '9', concentrationPercent: exact(2), litres: exact(1501) }, /1,500 L/],
    ['medical waste', { hazardClass: '6.2' }, /samples and medical waste/],
  ] as const)('%s', (_name, fields, problem) => {
    const { problems } = vanLoad([aPackage(fields)]);
    if (problem === null) expect(problems).toEqual([]);
    else expect(problems[0]).toMatch(problem);
  });
});

describe('the van', () => {
  it('adds up what counts, packaging included, to 200 kg', () => {
    const load = vanLoad([aPackage({ grossKg: exact(20), count: 10 })]);
    expect([load.totalKg.valueOf(), load.withinAggregate, load.problems]).toEqual([200, true, []]);
  });

  it('says when it is too much', () => {
    const load = vanLoad([aPackage({ grossKg: exact(20), count: 10 }), aPackage({ grossKg: exact('0.1') })]);
    expect(load.withinAggregate).toBe(false);
    expect(load.problems).toEqual([expect.stringContaining('more than 200 kg')]);
  });

  it('counts aerosols by weight, and neither wash water nor a tank of diluted Class 9', () => {
    const load = vanLoad([
      aPackage({ name: 'Water tank', hazardClass: null, packingGroup: null, grossKg: exact(300) }),
      aPackage({ name: 'Rinse tank', hazardClass: '9', concentrationPercent: exact(1), grossKg: exact(300) }),
      aPackage({
        name: 'Can',
        hazardClass: null,
        packingGroup: null,
        isAerosol: true,
        grossKg: exact('0.5'),
        count: 6,
      }),
    ]);
    expect(load.totalKg.valueOf()).toBe(3);
    expect(load.notCounted).toEqual(['Water tank', 'Rinse tank']);
  });
});
