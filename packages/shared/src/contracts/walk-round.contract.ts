import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { bytes, id, instant, shortText, sizeClass } from './fields.ts';
import { everyone } from '../authz/actor.ts';
import { progressStates } from '../domain/board/progress.ts';
import { bodies } from '../domain/walk-round/body.ts';
import { conditions, lookOutcomes } from '../domain/walk-round/condition.ts';
import { markAnswers, markKinds, markSizes } from '../domain/walk-round/marks.ts';
import { photoMoments, photoSets, photoViews } from '../domain/walk-round/views.ts';

const thousandths = z.int().min(0).max(1000);
const markBody = z.strictObject({
  id,
  x: thousandths,
  y: thousandths,
  place: shortText.min(1, 'Say where on the car.'),
  kind: z.enum(markKinds, 'Choose what it is.'),
  size: z.enum(markSizes, 'Choose how large it is.'),
  note: shortText,
  carriedFrom: id.nullable(),
  answer: z.enum(markAnswers).nullable(),
});
export type MarkBody = z.infer<typeof markBody>;

const dated = { at: instant, by: z.string() };
export const walkMarkDto = markBody.extend({
  /** Put down after work began. */
  isAddition: z.boolean(),
  ...dated,
});
export type WalkMarkDto = z.infer<typeof walkMarkDto>;

export const walkPhotoDto = z.object({
  id,
  vehicleId: id.nullable(),
  view: z.enum(photoViews),
  moment: z.enum(photoMoments),
  /** Bytes that have arrived, of how many; the picture can be seen when it is whole. */
  receivedBytes: z.int(),
  bytes: z.int(),
  isStored: z.boolean(),
  width: z.int().nullable(),
  height: z.int().nullable(),
  /** A picture of the car as it came, taken after work began. */
  isAddition: z.boolean(),
  ...dated,
});
export type WalkPhotoDto = z.infer<typeof walkPhotoDto>;

/** Strokes of a pen: points as x and y in turn, in units of a pad 300 wide and 100 high. */
const strokes = z
  .array(z.array(z.number().min(-50).max(400)).min(2).max(4000))
  .min(1, 'Let the customer sign, or pick why nobody did.')
  .max(60);

const conditionsOfCar = {
  body: z.enum(bodies),
  paint: z.enum(conditions, 'Choose how the paint is.').nullable(),
  interior: z.enum(conditions, 'Choose how the interior is.').nullable(),
  /** As the dash shows it, in the company's unit of distance. */
  odometer: z.int('Give whole numbers.').min(0).max(9_999_999, 'That is more than an odometer shows.').nullable(),
  hasItems: z.boolean().nullable(),
  itemsNote: shortText,
  /** The customer lets the crew move the car. */
  mayMove: z.boolean().nullable(),
  isTooDirty: z.boolean(),
  /** Why views are missing; empty when none is. */
  missingReason: shortText,
  /** Why nobody signed; empty when the customer did. */
  absentReason: shortText,
  initials: strokes.nullable(),
};

export const walkRoundDto = z.object({
  id,
  ...conditionsOfCar,
  /** It reached the server after work had begun. */
  isLate: z.boolean(),
  marks: z.array(walkMarkDto),
  /** Photos the phone says it took, by view; those that have not arrived are still on it. */
  photoViews: z.array(z.object({ id, view: z.enum(photoViews) })),
  secondLook: z.object({ outcome: z.enum(lookOutcomes), note: z.string(), ...dated }).nullable(),
  ...dated,
});
export type WalkRoundDto = z.infer<typeof walkRoundDto>;

export const walkCarDto = z.object({
  vehicleId: id.nullable(),
  vehicle: z.string(),
  sizeClass,
  photoSet: z.enum(photoSets),
  walkRound: walkRoundDto.nullable(),
  /** Marks of this car's last walk-round that are to be asked about. */
  lastMarks: z.array(walkMarkDto),
  lastAt: instant.nullable(),
  photos: z.array(walkPhotoDto),
});
export type WalkCarDto = z.infer<typeof walkCarDto>;

export const walkSheetDto = z.object({
  visitId: id,
  jobNumber: z.int(),
  customerName: z.string(),
  progress: z.enum(progressStates),
  /** When work began; from then on nothing is changed, only added. */
  startedAt: instant.nullable(),
  /** Why work began without a walk-round. */
  startReason: z.string(),
  cars: z.array(walkCarDto),
});
export type WalkSheetDto = z.infer<typeof walkSheetDto>;

export const getWalkSheet = endpoint({
  method: 'get',
  path: '/api/visits/:id/walk-round',
  roles: everyone,
  summary: 'The walk-rounds of a visit’s cars, with photos and the marks of last time.',
  params: z.object({ id }),
  response: z.object({ sheet: walkSheetDto }),
});

const pressed = {
  /** Made by the phone, one per press: the same key is taken once. */
  key: z.uuid(),
  deviceAt: instant,
  /** Device time minus server time at the last contact, milliseconds. */
  offsetMs: z.int().default(0),
  vehicleId: id.nullable(),
};

export const walkRoundBody = z.strictObject({
  ...pressed,
  ...conditionsOfCar,
  marks: z.array(markBody).max(200, 'At most 200 marks.'),
  photoViews: z.array(z.strictObject({ id, view: z.enum(photoViews) })).max(100, 'At most 100 photos.'),
});
export type WalkRoundBody = z.infer<typeof walkRoundBody>;
export const postWalkRound = endpoint({
  method: 'post',
  path: '/api/visits/:id/walk-round',
  roles: everyone,
  summary: 'Finish the walk-round of one car; it may be finished anew until work starts.',
  params: z.object({ id }),
  body: walkRoundBody,
  response: z.object({ sheet: walkSheetDto, isRepeat: z.boolean() }),
});

export const walkAdditionBody = z.discriminatedUnion('kind', [
  z.strictObject({ ...pressed, kind: z.literal('mark'), mark: markBody }),
  z.strictObject({
    ...pressed,
    kind: z.literal('second_look'),
    outcome: z.enum(lookOutcomes, 'Say what the second look found.'),
    note: shortText.default(''),
  }),
]);
export type WalkAdditionBody = z.infer<typeof walkAdditionBody>;
export const postWalkAddition = endpoint({
  method: 'post',
  path: '/api/visits/:id/walk-round/additions',
  roles: everyone,
  summary: 'Add a dated mark after work began, or answer the second look.',
  params: z.object({ id }),
  body: walkAdditionBody,
  response: z.object({ sheet: walkSheetDto, isRepeat: z.boolean() }),
});

export const photoBody = z.strictObject({
  ...pressed,
  view: z.enum(photoViews, 'Choose a view.'),
  moment: z.enum(photoMoments, 'Choose before, after or second look.'),
  bytes: z.int().min(1),
  /** SHA-256 of the whole, hex: what arrived in pieces is what left the phone. */
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
});
export type PhotoBody = z.infer<typeof photoBody>;
export const postPhoto = endpoint({
  method: 'post',
  path: '/api/visits/:id/photos',
  roles: everyone,
  summary: 'Announce a photo; its key becomes its id, and the answer says from where to send.',
  params: z.object({ id }),
  body: photoBody,
  response: z.object({ photo: walkPhotoDto, isRepeat: z.boolean() }),
});

export const putPhotoPiece = endpoint({
  method: 'put',
  path: '/api/photos/:id/bytes',
  roles: everyone,
  summary: 'The next piece of a photo as raw bytes, from `offset` on; the last one completes it.',
  params: z.object({ id }),
  query: z.object({ offset: z.coerce.number<string>().int().min(0) }),
  response: z.object({ photo: walkPhotoDto }),
});

export const getPhoto = endpoint({
  method: 'get',
  path: '/api/photos/:id',
  roles: everyone,
  summary: 'A photo, for the visit’s crew near its day and the desk.',
  params: z.object({ id }),
  response: bytes,
  format: 'jpeg',
});
