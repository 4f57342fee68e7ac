import { z } from 'zod'
import { timeSchema } from '@/lib/contracts/common'
import { noteEventSchema, settlementSchema } from '@/lib/contracts/notes'
import { anchorSchema, type Anchor } from '@/scene/model/anchor'
import { stillDrawingSchema, type StillDrawing } from '@/scene/model/still-drawing'

/** What the tables of notes keep as JSON: read, never cast. */
const settledSchema = z.object({
  by: z.string(),
  at: timeSchema,
  words: z.string(),
  settlement: settlementSchema,
})
export type Settled = z.output<typeof settledSchema>

const mentionSchema = z.object({ userId: z.uuid(), name: z.string() })
export type Mention = z.output<typeof mentionSchema>

export type StoredEvent = z.output<typeof noteEventSchema>['what']

export const storedAnchor = (json: unknown): Anchor => anchorSchema.parse(json)
export const storedDrawing = (json: unknown): StillDrawing | null => stillDrawingSchema.nullable().parse(json)
export const storedMentions = (json: unknown): Mention[] => z.array(mentionSchema).parse(json)
export const storedSettled = (json: unknown): Settled | null => settledSchema.nullable().parse(json)
export const storedEvent = (json: unknown): StoredEvent => noteEventSchema.shape.what.parse(json)
