import { z } from 'zod'
import { operations, roles } from '@/lib/auth/access'
import { cursorSchema, idSchema, limitSchema, timeSchema } from './common'
import { operation } from './operation'

export const workshopNameSchema = z.string().trim().min(1).max(120)

export const workshopSchema = z
  .object({
    id: idSchema,
    name: z.string(),
    /** Nobody approves a version that they made themselves. */
    needsTwoPeople: z.boolean(),
    /** What a review asks about unless it says otherwise. */
    checklist: z.array(z.string()),
    /** How long it is kept when and how a share link was opened. */
    openingsKeptDays: z.int(),
    createdAt: timeSchema,
    role: z.enum(roles).nullable(),
    may: z.array(z.enum(operations)),
  })
  .meta({ id: 'Workshop' })
export type WorkshopAnswer = z.output<typeof workshopSchema>

const byId = z.object({ id: idSchema })
const ownerless = { 409: 'The workshop would be left without an owner' } as const

export const createWorkshop = operation({
  id: 'createWorkshop',
  method: 'POST',
  path: '/api/v1/workshops',
  summary: 'Make a further workshop, owned by whoever asks and before them from then on',
  for: 'person',
  atPage: true,
  limit: 'writing',
  body: z.object({ name: workshopNameSchema }),
  status: 201,
  answer: z.object({ id: idSchema }),
})

export const readWorkshop = operation({
  id: 'readWorkshop',
  method: 'GET',
  path: '/api/v1/workshops/{id}',
  summary: 'A workshop and how it is set',
  for: 'person',
  limit: 'reading',
  params: byId,
  status: 200,
  answer: workshopSchema,
})

export const checklistItem = z.string().trim().min(1).max(120)
export const mostChecklistItems = 20

export const changeWorkshop = operation({
  id: 'changeWorkshop',
  method: 'PATCH',
  path: '/api/v1/workshops/{id}',
  summary: 'Change a workshop’s name and how it is set',
  for: 'person',
  limit: 'writing',
  params: byId,
  body: z.object({
    name: workshopNameSchema.optional(),
    needsTwoPeople: z.boolean().optional(),
    checklist: z.array(checklistItem).max(mostChecklistItems).optional(),
    openingsKeptDays: z.int().min(1).max(730).optional(),
  }),
  status: 200,
  answer: workshopSchema,
})

export const memberSchema = z
  .object({
    id: idSchema,
    name: z.string(),
    email: z.string(),
    role: z.enum(roles),
    since: timeSchema,
    you: z.boolean(),
  })
  .meta({ id: 'Member' })
export type Member = z.output<typeof memberSchema>

export const listPeople = operation({
  id: 'listPeople',
  method: 'GET',
  path: '/api/v1/workshops/{id}/people',
  summary: 'Who belongs to a workshop, in the order in which they came',
  for: 'person',
  limit: 'reading',
  params: byId,
  query: z.object({ after: cursorSchema.optional(), limit: limitSchema }),
  status: 200,
  answer: z.object({ people: z.array(memberSchema), next: cursorSchema.nullable() }),
})

const memberOfWorkshop = z.object({ id: idSchema, person: idSchema })

export const changeRole = operation({
  id: 'changeRole',
  method: 'PATCH',
  path: '/api/v1/workshops/{id}/people/{person}',
  summary: 'Give somebody another role',
  for: 'person',
  limit: 'writing',
  params: memberOfWorkshop,
  body: z.object({ role: z.enum(roles) }),
  status: 204,
  problems: ownerless,
})

export const removePerson = operation({
  id: 'removePerson',
  method: 'DELETE',
  path: '/api/v1/workshops/{id}/people/{person}',
  summary: 'Take somebody out of a workshop; what they made stays, their API tokens for it end',
  for: 'person',
  limit: 'writing',
  params: memberOfWorkshop,
  status: 204,
  problems: ownerless,
})

export const leaveWorkshop = operation({
  id: 'leaveWorkshop',
  method: 'DELETE',
  path: '/api/v1/workshops/{id}/membership',
  summary: 'Leave a workshop',
  for: 'person',
  atPage: true,
  limit: 'writing',
  params: byId,
  status: 204,
  problems: ownerless,
})

export const transferWorkshop = operation({
  id: 'transferWorkshop',
  method: 'POST',
  path: '/api/v1/workshops/{id}/transfers',
  summary: 'Hand a workshop over: somebody else becomes owner, and who asks takes the role named',
  for: 'person',
  atPage: true,
  limit: 'writing',
  params: byId,
  body: z.object({ to: idSchema, role: z.enum(roles).exclude(['owner']) }),
  status: 204,
})

export const workshopOperations = [
  createWorkshop,
  readWorkshop,
  changeWorkshop,
  listPeople,
  changeRole,
  removePerson,
  leaveWorkshop,
  transferWorkshop,
]
