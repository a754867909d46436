import { describe, expect, test } from 'vitest';
import type { VisitWorkDto } from '@driprail/shared/contracts/job-work.contract';
import type { KeptPress } from '../../../lib/outbox/store.ts';
import { countSteps, workView } from './work-view.ts';

const at = (clock: string) => `2026-05-14T${clock}:00.000Z`;
const step = (id: string, isAlone = false) => ({
  ...{ id, stage: 'wash' as const, words: id, product: '', ratio: '', pour: null, dose: '', kitCase: null },
  ...{ towel: null, caution: '', isAlone },
});
const work = {
  ...{ visitId: 'v', customerName: 'Nakagawa', progress: 'on_site', startedAt: null, events: [], changes: [] },
  mustKnows: [{ code: 'dog', key: 'dog', words: 'A dog is here.' }],
  lines: [
    {
      ...{ id: 'l', serviceId: 's', serviceName: 'Wash', vehicleId: 'c', vehicle: 'car', sizeClass: 'sedan' },
      ...{
        minutes: 60,
        priceCents: 100,
        isFinished: false,
        asksNote: true,
        steps: [step('rinse'), step('check', true)],
      },
    },
  ],
} as unknown as VisitWorkDto;
let count = 0;
const press = (path: KeptPress['path'], clock: string, body: object, targetId = 'v'): KeptPress => ({
  ...{ key: `k${(count += 1)}`, userId: 'u', at: count, path, targetId, words: 'Change of the job', refused: null },
  body: { deviceAt: at(clock), ...body },
});
const tick = (clock: string, stepId: string) =>
  press('work', clock, { kind: 'tick', steps: [{ lineId: 'l', stepId }] });

describe('the work of a visit with what waits on this phone', () => {
  test('counts waiting presses as done, by this person and at the phone’s corrected time', () => {
    const waiting = [
      press('work', '15:00', { kind: 'confirm', keys: ['dog'] }),
      press('visit', '15:01', { kind: 'start_work' }),
      press('work', '15:12', { ...tick('15:12', 'rinse').body, offsetMs: 120_000 }),
    ];
    const view = workView(work, waiting, 'Sefa Lund');
    expect(view).toMatchObject({ progress: 'working', startedAt: at('15:01'), open: [] });
    expect(view.state.ticks.get('l/rinse')).toEqual({ at: at('15:10'), by: 'Sefa Lund' });
    expect(countSteps(view.vehicles)).toEqual({ done: 1, all: 2 });
  });

  test('says what is open and missing, and leaves another visit’s presses alone', () => {
    const view = workView(work, [press('work', '15:00', { kind: 'confirm', keys: ['dog'] }, 'other')], '');
    expect(view.open.map((one) => one.key)).toEqual(['dog']);
    expect(view.missing.map((one) => one.key)).toEqual(['l/check', 'note']);
    const gone = [press('work', '15:00', { kind: 'go_on', keys: ['l/check'], words: 'Not needed' })];
    expect(workView(work, gone, '').missing.map((one) => one.key)).toEqual(['note']);
  });

  test('shows changes that have not left the phone', () => {
    expect(workView(work, [press('change', '15:00', {})], '').waitingChanges).toEqual(['Change of the job']);
  });
});
