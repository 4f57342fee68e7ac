import { z } from 'zod'

/** Every task by its name, and what a job of it carries: ids and no more, since what they name may change until it runs. */
export const payloads = {
  'mail.send': z.object({ mailId: z.uuid() }),
  'mail.digest': z.object({ userId: z.uuid() }),
  'picture.draw': z.object({ sceneId: z.uuid(), version: z.int().min(1) }),
  'export.make': z.object({ exportId: z.uuid() }),
  'expired.clean': z.object({}),
  'openings.erase': z.object({}),
  'review.remind': z.object({ requestId: z.uuid(), reminder: z.enum(['before', 'due']) }),
} as const satisfies Record<string, z.ZodObject>

type Payloads = { [Name in keyof typeof payloads]: z.output<(typeof payloads)[Name]> }

export type TaskName = keyof Payloads
export type PayloadOf<Name extends TaskName> = Payloads[Name]

const schemas: { [Name in TaskName]: z.ZodType<PayloadOf<Name>> } = payloads

/** What a job carries is read, on its way in and out. */
export const readPayload = <Name extends TaskName>(name: Name, payload: unknown): PayloadOf<Name> =>
  schemas[name].parse(payload)
