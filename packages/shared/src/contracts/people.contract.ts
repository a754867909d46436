import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, done, equipment, id, instant, name, phone, planVersion, shortText, skill } from './fields.ts';
import { desk, everyone } from '../authz/actor.ts';

export const timeOffDto = z.object({ id, startsOn: day, endsOn: day, note: z.string() });
export const personDto = z.object({
  id,
  name: z.string(),
  phone: z.string(),
  skills: z.array(skill),
  isTrainee: z.boolean(),
  isActive: z.boolean(),
  /** A dated fact by duties: owners, managers and supervisors never share tips (29 USC 203(m)(2)(B)). */
  sharesTips: z.boolean(),
  loginRole: z.string().nullable(),
  timeOff: z.array(timeOffDto),
  version: z.int(),
});
export type PersonDto = z.infer<typeof personDto>;

export const personBody = z.strictObject({
  name,
  phone,
  skills: z.array(skill),
  isTrainee: z.boolean(),
  isActive: z.boolean(),
  sharesTips: z.boolean(),
});
export const listPeople = endpoint({
  method: 'get',
  path: '/api/people',
  roles: desk,
  summary: 'The people of the company, with skills and time off.',
  response: z.object({ people: z.array(personDto) }),
});
export const createPerson = endpoint({
  method: 'post',
  path: '/api/people',
  roles: desk,
  summary: 'Add a person.',
  body: personBody,
  response: z.object({ person: personDto }),
});
export const updatePerson = endpoint({
  method: 'put',
  path: '/api/people/:id',
  roles: desk,
  summary: 'Change a person.',
  params: z.object({ id }),
  body: personBody.extend({ version: planVersion }),
  response: z.object({ person: personDto }),
});
export const addTimeOff = endpoint({
  method: 'post',
  path: '/api/people/:id/time-off',
  roles: desk,
  summary: 'Put a person’s days off on the calendar.',
  params: z.object({ id }),
  body: z.strictObject({ startsOn: day, endsOn: day, note: shortText }).refine((body) => body.endsOn >= body.startsOn, {
    path: ['endsOn'],
    message: 'The last day can’t be before the first.',
  }),
  response: z.object({ person: personDto }),
});
export const removeTimeOff = endpoint({
  method: 'delete',
  path: '/api/time-off/:id',
  roles: desk,
  summary: 'Take days off back.',
  params: z.object({ id }),
  response: done,
});

export const vanDto = z.object({
  id,
  name: z.string(),
  plate: z.string(),
  equipment: z.array(equipment),
  notes: z.string(),
  position: z.int(),
  isActive: z.boolean(),
  version: z.int(),
});
export type VanDto = z.infer<typeof vanDto>;
export const vanBody = z.strictObject({
  name: name.max(16, 'At most 16 letters: it heads a column.'),
  plate: z.string().trim().max(16, 'At most 16 letters.'),
  equipment: z.array(equipment),
  notes: shortText,
  position: z.int().min(0).max(99),
  isActive: z.boolean(),
});
export const listVans = endpoint({
  method: 'get',
  path: '/api/vans',
  roles: everyone,
  summary: 'The vans.',
  response: z.object({ vans: z.array(vanDto) }),
});
export const createVan = endpoint({
  method: 'post',
  path: '/api/vans',
  roles: desk,
  summary: 'Add a van.',
  body: vanBody,
  response: z.object({ van: vanDto }),
});
export const updateVan = endpoint({
  method: 'put',
  path: '/api/vans/:id',
  roles: desk,
  summary: 'Change a van.',
  params: z.object({ id }),
  body: vanBody.extend({ version: planVersion }),
  response: z.object({ van: vanDto }),
});

export const crewMemberDto = z.object({
  id,
  personId: id,
  name: z.string(),
  from: instant,
  to: instant,
  position: z.int(),
});
export const setVanCrew = endpoint({
  method: 'put',
  path: '/api/vans/:id/crew/:day',
  roles: desk,
  summary: 'Who rides in a van on a day, in crew order; a swap ends one span and starts another.',
  params: z.object({ id, day }),
  body: z.strictObject({
    members: z
      .array(
        z
          .strictObject({ personId: id, from: instant, to: instant })
          .refine((m) => m.to > m.from, 'The end must be after the start.'),
      )
      .max(8, 'At most eight people ride in a van.'),
  }),
  response: z.object({ crew: z.array(crewMemberDto) }),
});
