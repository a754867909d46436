import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { listPayPlaces } from '@driprail/shared/contracts/pay-plans.contract';
import { exact } from '@driprail/shared/domain/money/exact';

type Places = OutputOf<typeof listPayPlaces>;
type Dated = { startsOn: string };

/** The higher of the company's minimum wage and that of the place where a person works on a day. */
export function minimumWageOn(
  { places, people }: Places,
  companyWage: string | null,
  personId: string | null,
  day: string,
): string | null {
  const placed = newest(
    people.filter((one) => one.personId === personId),
    day,
  );
  const place = places.find((one) => one.id === placed?.placeId);
  const wage = newest(place?.minimumWages ?? [], day)?.amount ?? null;
  if (wage === null || (companyWage !== null && exact(companyWage).gt(exact(wage)))) return companyWage;
  return wage;
}

function newest<T extends Dated>(dated: readonly T[], day: string): T | null {
  return dated
    .filter((one) => one.startsOn <= day)
    .reduce<T | null>((best, one) => (best === null || one.startsOn > best.startsOn ? one : best), null);
}
