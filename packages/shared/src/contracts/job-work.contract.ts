import { z } from 'zod';
import { checkStepDto } from './checklist.contract.ts';
import { endpoint } from './endpoint.ts';
import { day, id, instant, positiveCents, shortText, sizeClass } from './fields.ts';
import { serviceKinds, surchargesDto } from './services.contract.ts';
import { visitLineDto } from './visit.dto.ts';
import { desk, everyone } from '../authz/actor.ts';
import { progressStates } from '../domain/board/progress.ts';
import { workKinds } from '../domain/job-work/fold-work.ts';
import { hindranceCodes, raisedConditions } from '../domain/job-work/judge-change.ts';
import { mustKnowCodes } from '../domain/job-work/must-knows.ts';

const stepRef = z.strictObject({ lineId: id, stepId: id });

export const workEventDto = z.object({
  id,
  kind: z.enum(workKinds),
  at: instant,
  by: z.string(),
  steps: z.array(stepRef),
  lineId: id.nullable(),
  keys: z.array(z.string()),
  words: z.string(),
});

export const changeKinds = ['add', 'drop', 'swap', 'condition'] as const;
/** `done` was applied at once; `asked` waits for the board; `quote` is kept for later. */
export const changeStates = ['done', 'asked', 'accepted', 'declined', 'quote'] as const;

const hindranceDto = z.object({ code: z.enum(hindranceCodes), message: z.string() });
const changedLineDto = z.object({
  id: id.nullable(),
  serviceId: id,
  serviceName: z.string(),
  priceCents: z.int(),
  minutes: z.int(),
});
export const jobChangeDto = z.object({
  id,
  visitId: id,
  jobNumber: z.int(),
  customerName: z.string(),
  kind: z.enum(changeKinds),
  state: z.enum(changeStates),
  words: z.string(),
  reason: z.string(),
  before: z.array(changedLineDto),
  after: z.array(changedLineDto),
  priceDifferenceCents: z.int(),
  minutesDifference: z.int(),
  finishAt: instant,
  hindrances: z.array(hindranceDto),
  /** The crew had no signal: nobody at the board was asked before the customer said yes. */
  isBoardNotAsked: z.boolean(),
  /** The customer's typed name; empty for a yes in person. */
  saidYesBy: z.string(),
  saidYesAt: instant,
  by: z.string(),
  at: instant,
  answeredBy: z.string().nullable(),
  answeredAt: instant.nullable(),
  answer: z.string(),
});
export type JobChangeDto = z.infer<typeof jobChangeDto>;

export const workLineDto = visitLineDto.extend({
  steps: z.array(checkStepDto),
  asksNote: z.boolean(),
});

/** One visit's work, with all that the phone needs to run it without signal. */
export const visitWorkDto = z.object({
  visitId: id,
  jobNumber: z.int(),
  customerName: z.string(),
  address: z.string(),
  progress: z.enum(progressStates),
  plannedFrom: instant.nullable(),
  arrivedAt: instant.nullable(),
  startedAt: instant.nullable(),
  mustKnows: z.array(z.object({ code: z.enum(mustKnowCodes), key: z.string(), words: z.string() })),
  takesKey: z.boolean(),
  /** Empty where the crew asks, or may not know yet. */
  keyGoesBack: z.string(),
  lines: z.array(workLineDto),
  events: z.array(workEventDto),
  changes: z.array(jobChangeDto),
  crewSize: z.int(),
  crewSkills: z.array(z.string()),
  next: z.object({ customerName: z.string(), windowTo: instant.nullable(), driveMinutes: z.int() }).nullable(),
});
export type VisitWorkDto = z.infer<typeof visitWorkDto>;

export const offerDto = z.object({
  serviceId: id,
  name: z.string(),
  kind: z.enum(serviceKinds),
  skills: z.array(z.string()),
  weather: z.string(),
  prices: z.array(z.object({ sizeClass, priceCents: z.int(), minutes: z.int() })),
});
export const dayWorkDto = z.object({
  day,
  works: z.array(visitWorkDto),
  offers: z.array(offerDto),
  surcharges: surchargesDto,
});
export type DayWorkDto = z.infer<typeof dayWorkDto>;

export const getDayWork = endpoint({
  method: 'get',
  path: '/api/run-sheet/:day/work',
  roles: everyone,
  summary: 'Steps, must-knows and what was done, for one’s own crew’s day; with today’s menu for a change at the car.',
  params: z.object({ day }),
  response: dayWorkDto,
});
export const getVisitWork = endpoint({
  method: 'get',
  path: '/api/visits/:id/work',
  roles: desk,
  summary: 'The work of one visit as far as it is done.',
  params: z.object({ id }),
  response: z.object({ work: visitWorkDto }),
});

/** Each press carries its key and the phone's time; the same key is taken once. */
const pressed = { key: z.uuid(), deviceAt: instant, offsetMs: z.int().default(0) };

export const workActionBody = z.strictObject({
  ...pressed,
  kind: z.enum(workKinds),
  steps: z.array(stepRef).max(500).default([]),
  lineId: id.nullable().default(null),
  keys: z.array(z.string().max(200)).max(200).default([]),
  words: shortText.default(''),
});
export type WorkActionBody = z.input<typeof workActionBody>;
export const postWorkAction = endpoint({
  method: 'post',
  path: '/api/visits/:id/work',
  roles: everyone,
  summary: 'Confirm the must-knows, tick steps or take ticks back, run a timer, note what was used, the key.',
  params: z.object({ id }),
  body: workActionBody,
  response: z.object({ work: visitWorkDto, isRepeat: z.boolean() }),
});

export const changeBody = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('add'), serviceId: id, vehicleId: id.nullable(), sizeClass }),
  z.strictObject({ kind: z.literal('drop'), lineId: id }),
  z.strictObject({ kind: z.literal('swap'), lineId: id, serviceId: id }),
  z.strictObject({
    kind: z.literal('condition'),
    lineId: id,
    condition: z.enum(raisedConditions),
    extraCents: positiveCents.max(1_000_000, 'At most 10,000.00.').default(0),
    extraMinutes: z.int().min(0).max(600, 'At most 10 hours.').default(0),
  }),
]);
export const postJobChange = endpoint({
  method: 'post',
  path: '/api/visits/:id/changes',
  roles: everyone,
  summary: 'Change the job at the car after the customer’s yes; what breaks a promise is asked of the board.',
  params: z.object({ id }),
  body: z.strictObject({
    ...pressed,
    change: changeBody,
    reason: shortText.min(1, 'Say why.'),
    /** What the customer saw and said yes to. */
    shownCents: z.int(),
    saidYes: z.strictObject({ by: z.string().trim().max(80, 'At most 80 letters.'), at: instant }),
    /** Kept as a quote for another day instead of done now. */
    isQuote: z.boolean().default(false),
    /** There was no signal to ask the board. */
    isBoardNotAsked: z.boolean().default(false),
  }),
  response: z.object({ work: visitWorkDto, changeId: id, isRepeat: z.boolean() }),
});
export const answerJobChange = endpoint({
  method: 'post',
  path: '/api/changes/:id/answer',
  roles: desk,
  summary: 'Accept a change that the crew asks for, or decline it: then it stays as a quote.',
  params: z.object({ id }),
  body: z.strictObject({ isAccepted: z.boolean(), note: shortText.default('') }),
  response: z.object({ ok: z.literal(true) }),
});
export const getOpenWork = endpoint({
  method: 'get',
  path: '/api/open-work',
  roles: desk,
  summary: 'What waits for the desk: keys that were not handed back, and changes that crews ask for.',
  response: z.object({
    keys: z.array(
      z.object({
        visitId: id,
        jobNumber: z.int(),
        customerName: z.string(),
        vanName: z.string(),
        takenBy: z.string(),
        takenAt: instant,
        words: z.string(),
        day: day.nullable(),
      }),
    ),
    changes: z.array(jobChangeDto),
  }),
});
export type OpenWorkDto = z.infer<(typeof getOpenWork)['response']>;
