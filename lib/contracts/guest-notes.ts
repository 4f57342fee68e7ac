import { z } from 'zod'
import { anchorSchema } from '@/scene/model/anchor'
import { stillDrawingSchema } from '@/scene/model/still-drawing'
import { idSchema, timeSchema } from './common'
import { guestNoteKinds, mostOfNotes, noteKinds, noteStates } from './notes'
import { operation } from './operation'

const ordinal = z.int().min(1)
const wordsSchema = z.string().trim().min(1).max(mostOfNotes.words)
const nameSchema = z.string().trim().min(1).max(mostOfNotes.guestName)

export const guestPostSchema = z.object({
  post: ordinal,
  /** As the guest gave it, or the name of whoever replied. */
  by: z.string(),
  guest: z.boolean(),
  at: timeSchema,
  edited: z.boolean(),
  deleted: z.boolean(),
  /** Nobody's name is told who did not write here: a mention reads "@colleague". */
  words: z.string(),
  drawing: stillDrawingSchema.nullable(),
})

/** A note made through a link, as whoever holds that link sees it. */
export const guestNoteSchema = z
  .object({
    id: idSchema,
    /** Among those of the link, from 1: the scene's own numbers are the workshop's. */
    number: ordinal,
    version: ordinal,
    kind: z.enum(noteKinds),
    state: z.enum(noteStates),
    heading: z.string(),
    anchor: anchorSchema,
    part: z.string(),
    posts: z.array(guestPostSchema),
  })
  .meta({ id: 'GuestNote' })
export type GuestNote = z.output<typeof guestNoteSchema>

/** Any text: what could not be a token is answered like one that is not known. */
const byToken = z.object({ token: z.string() })
const problems = { 404: 'Unknown, ended or withdrawn: the same answer for each' } as const

export const listGuestNotes = operation({
  id: 'listGuestNotes',
  method: 'GET',
  path: '/api/v1/shared/{token}/notes',
  summary: 'Notes made through a share link that allows them, with the replies to them',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  query: z.object({
    after: z.coerce.number().int().min(1).max(1_000_000).optional(),
    limit: z.coerce.number().int().min(1).max(50).default(25),
  }),
  status: 200,
  answer: z.object({ notes: z.array(guestNoteSchema), next: ordinal.nullable() }),
  problems,
})

export const makeGuestNote = operation({
  id: 'makeGuestNote',
  method: 'POST',
  path: '/api/v1/shared/{token}/notes',
  summary: 'Pin a note as a guest, to the version that the link opens',
  for: 'anyone',
  limit: 'guest-writing',
  params: byToken,
  body: z.object({
    name: nameSchema,
    anchor: anchorSchema,
    kind: z.enum(guestNoteKinds).default('remark'),
    heading: z.string().trim().max(mostOfNotes.heading).default(''),
    words: wordsSchema,
    drawing: stillDrawingSchema.nullable().default(null),
  }),
  status: 201,
  answer: z.object({ note: guestNoteSchema }),
  problems,
})

export const replyAsGuest = operation({
  id: 'replyAsGuest',
  method: 'POST',
  path: '/api/v1/shared/{token}/notes/{number}/posts',
  summary: 'Reply as a guest to a note made through the same link',
  for: 'anyone',
  limit: 'guest-writing',
  params: z.object({ token: z.string(), number: z.coerce.number().int().min(1).max(1_000_000) }),
  body: z.object({ name: nameSchema, words: wordsSchema }),
  status: 201,
  answer: z.object({ note: guestNoteSchema }),
  problems,
})

export const guestNoteOperations = [listGuestNotes, makeGuestNote, replyAsGuest]
