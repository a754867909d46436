import { z } from 'zod';
import { id, instant, planVersion, sizeClass } from './fields.ts';
import { progressStates } from '../domain/board/progress.ts';
import { photoSets } from '../domain/walk-round/views.ts';

export const visitLineDto = z.object({
  id,
  serviceId: id,
  serviceName: z.string(),
  vehicleId: id.nullable(),
  vehicle: z.string(),
  sizeClass,
  minutes: z.int(),
  priceCents: z.int(),
  isFinished: z.boolean(),
});
export type VisitLineDto = z.infer<typeof visitLineDto>;

export const visitCrewDto = z.object({ personId: id, name: z.string() });

/** What a visit's cars ask of the walk-round, and how far it is. */
export const visitWalkDto = z.object({
  /** The largest set that a line asks for. */
  photoSet: z.enum(photoSets),
  /** Cars that need one, and those that have it. */
  cars: z.int(),
  made: z.int(),
  /** The cars that still need one. */
  due: z.array(id.nullable()),
  /** A car was too dirty to see, and nobody has looked again. */
  isSecondLookDue: z.boolean(),
  /** Why work began without it. */
  startReason: z.string(),
});
export type VisitWalkDto = z.infer<typeof visitWalkDto>;

/** A visit as the board shows it. */
export const visitDto = z.object({
  id,
  jobId: id,
  jobNumber: z.int(),
  /** This visit's place among the job's visits, "2 of 3". */
  part: z.int(),
  parts: z.int(),
  stopId: id,
  vanId: id.nullable(),
  from: instant.nullable(),
  to: instant.nullable(),
  minutes: z.int(),
  progress: z.enum(progressStates),
  /** When the present progress began. */
  since: instant.nullable(),
  reason: z.string(),
  planVersion,
  version: z.int(),
  customerId: id,
  customerName: z.string(),
  phone: z.string(),
  addressId: id,
  address: z.string(),
  area: z.string(),
  lat: z.number().nullable(),
  lng: z.number().nullable(),
  hasGateCode: z.boolean(),
  hasWater: z.boolean(),
  hasPower: z.boolean(),
  windowFrom: instant.nullable(),
  windowTo: instant.nullable(),
  notes: z.string(),
  /** Something of a past job is put right, free to the customer. */
  isCallBack: z.boolean(),
  lines: z.array(visitLineDto),
  skills: z.array(z.string()),
  equipment: z.array(z.string()),
  /** What the open lines ask of the place. */
  needsWater: z.boolean(),
  needsPower: z.boolean(),
  crew: z.array(visitCrewDto),
  walkRound: visitWalkDto,
  /** Reasons given for warnings, by the key of the facts. */
  accepted: z.array(z.object({ key: z.string(), code: z.string(), reason: z.string(), by: z.string(), at: instant })),
});
export type VisitDto = z.infer<typeof visitDto>;
