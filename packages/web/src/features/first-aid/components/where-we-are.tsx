import { useEffect, useState } from 'react';
import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import type { SessionDto } from '@driprail/shared/contracts/session.contract';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { serverNow } from '../../../lib/device-clock.ts';
import { readCopy } from '../../../lib/outbox/store.ts';

interface Kept {
  address: string | null;
  company: SessionDto['company'] | null;
}

const under = ['working', 'on_site', 'on_the_way', 'placed'];

/** What this phone has kept: the address of the visit at hand and the company's numbers; works without sign-in or signal. */
export function useKeptFacts(): Kept {
  const [kept, setKept] = useState<Kept>({ address: null, company: null });
  useEffect(() => {
    void readKept().then(setKept, () => undefined);
  }, []);
  return kept;
}

async function readKept(): Promise<Kept> {
  const session = (await readCopy<SessionDto>('session'))?.value;
  if (!session) return { address: null, company: null };
  const day = dayOf(serverNow().toISOString(), session.company.zone);
  const sheet = (await readCopy<RunSheetDto>(`${session.user.id}:run-sheet:${day}`))?.value;
  const visits = sheet?.visits ?? [];
  const at = under.map((progress) => visits.find((visit) => visit.progress === progress)).find(Boolean);
  return { address: at ? [at.address, at.area].filter(Boolean).join(', ') : null, company: session.company };
}
