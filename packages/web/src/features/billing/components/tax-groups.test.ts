import { expect, test } from 'vitest';
import type { TaxRateDto } from '@driprail/shared/contracts/taxes.contract';
import { taxGroups } from './tax-groups.ts';

const rate = (fields: Partial<TaxRateDto>): TaxRateDto => ({
  ...{ id: fields.startsOn ?? '', name: 'State sales tax', taxClass: 'standard', place: '', percent: '6.25' },
  ...{ startsOn: '2026-01-01', setBy: 'Rowan Tern', setAt: '2026-01-01T12:00:00Z' },
  ...fields,
});

test('rates of a name, place and class stand together; one of them holds today', () => {
  const groups = taxGroups(
    [
      rate({ startsOn: '2026-06-01', percent: '7' }),
      rate({ startsOn: '2026-05-14', name: 'state sales TAX ', percent: '6.5' }),
      rate({ startsOn: '2026-01-01' }),
      rate({ place: 'Ternmouth', startsOn: '2026-06-01' }),
      rate({ taxClass: 'reduced' }),
    ],
    '2026-05-14',
  );
  expect(groups.map(({ rates }) => rates.map(({ standing }) => standing))).toEqual([
    ['ahead', 'now', 'past'],
    ['ahead'],
    ['now'],
  ]);
});
