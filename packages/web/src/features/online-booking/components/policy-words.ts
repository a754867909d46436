import type { PolicyDto } from '@driprail/shared/contracts/online-booking.contract';
import { money } from '../../../lib/format.ts';

/** What changing or calling off costs, in a sentence. */
export function policyWords({
  freeUntilHours,
  lateFeeCents,
}: Pick<PolicyDto, 'freeUntilHours' | 'lateFeeCents'>): string {
  if (lateFeeCents === 0) return 'Calling off costs nothing.';
  if (freeUntilHours === 0)
    return `Calling off is free until the window begins; after that it costs ${money(lateFeeCents)}.`;
  const hours = freeUntilHours === 1 ? 'an hour' : `${freeUntilHours} hours`;
  return `Calling off is free until ${hours} before the window; after that it costs ${money(lateFeeCents)}.`;
}
