import { z } from 'zod'
import { anchorSchema, partChangeSchema, standings } from '@/scene/model/anchor'
import { stillDrawingSchema } from '@/scene/model/still-drawing'
import { idSchema, timeSchema } from './common'
import { operation } from './operation'

export const noteKinds = ['error', 'question', 'suggestion', 'remark'] as const
export type NoteKind = (typeof noteKinds)[number]
/** An error holds up a verdict of the workshop's: a guest does not give one. */
export const guestNoteKinds = ['question', 'suggestion', 'remark'] as const

export const noteStates = ['open', 'settled'] as const
export type NoteState = (typeof noteStates)[number]

/** How long its author may change what a post says. */
export const editMinutes = 15
export const mostOfNotes = { heading: 120, words: 4_000, mentions: 20, reason: 500, guestName: 80 } as const

const count = z.int().nonnegative()
const ordinal = z.int().min(1)
const headingSchema = z.string().trim().max(mostOfNotes.heading)
const wordsSchema = z.string().trim().min(1).max(mostOfNotes.words)
const mentionsSchema = z.array(idSchema).max(mostOfNotes.mentions)

/** Whoever wrote: a person of the workshop, or a guest by the name they gave. */
export const writerSchema = z.object({ id: idSchema.nullable(), name: z.string(), guest: z.boolean() })
export type Writer = z.output<typeof writerSchema>

export const settlementSchema = z.discriminatedUnion('reason', [
  z.object({ reason: z.literal('fixed'), version: ordinal }),
  z.object({ reason: z.literal('will-not-change') }),
  z.object({ reason: z.literal('duplicate'), number: ordinal }),
  z.object({ reason: z.literal('answered') }),
])
export type Settlement = z.output<typeof settlementSchema>

export const postSchema = z
  .object({
    /** Its place in the thread; 1 is what the note itself says. */
    post: ordinal,
    by: writerSchema,
    at: timeSchema,
    editedAt: timeSchema.nullable(),
    deletedAt: timeSchema.nullable(),
    /** Inert text; empty once deleted. */
    words: z.string(),
    mentions: z.array(z.object({ id: idSchema, name: z.string() })),
    drawing: stillDrawingSchema.nullable(),
    /** Goes up with each edit: an edit says which one it was made from. */
    revision: ordinal,
    /** Is it the asking person's own, and until when may they change it? */
    own: z.boolean(),
    editableUntil: timeSchema.nullable(),
    mayDelete: z.boolean(),
  })
  .meta({ id: 'NotePost' })
export type NotePost = z.output<typeof postSchema>

/** The pinned part in the version that is looked at: as it was, changed (look again), or no longer there. */
export const standingSchema = z.object({
  standing: z.enum(standings),
  changes: z.array(partChangeSchema),
})
export type NoteStanding = z.output<typeof standingSchema>

const noteFields = {
  id: idSchema,
  sceneId: idSchema,
  /** In its scene, from 1, without gaps. */
  number: ordinal,
  /** The version it was made on; `anchor.version` is where it is pinned now. */
  version: ordinal,
  kind: z.enum(noteKinds),
  state: z.enum(noteStates),
  heading: z.string(),
  by: writerSchema,
  at: timeSchema,
  anchor: anchorSchema,
  /** "Counterweight 4D": the part in words, as it was when pinned. */
  part: z.string(),
  /** What its first post says; empty once deleted. */
  words: z.string(),
  drawn: z.boolean(),
  replies: count,
  lastPostAt: timeSchema,
  settled: z
    .object({ by: z.string(), at: timeSchema, words: z.string(), settlement: settlementSchema })
    .nullable(),
  /** Goes up with each change of kind, heading, state and place. */
  revision: ordinal,
  own: z.boolean(),
  /** What the asking person may do with this one beyond what their role says: its author and judges alone. */
  maySettle: z.boolean(),
  mayChangeKind: z.boolean(),
}

/** A note in the list of a version. */
export const noteSummarySchema = z
  .object({ ...noteFields, ...standingSchema.shape })
  .meta({ id: 'NoteSummary' })
export type NoteSummary = z.output<typeof noteSummarySchema>

export const noteEventSchema = z.object({
  at: timeSchema,
  by: z.string(),
  what: z.discriminatedUnion('event', [
    z.object({ event: z.literal('settled'), settlement: settlementSchema, words: z.string() }),
    z.object({ event: z.literal('reopened'), words: z.string() }),
    z.object({ event: z.literal('moved'), from: anchorSchema, to: anchorSchema }),
    z.object({ event: z.literal('kind-changed'), from: z.enum(noteKinds), to: z.enum(noteKinds) }),
  ]),
})
export type NoteEvent = z.output<typeof noteEventSchema>

export const noteSchema = z
  .object({
    ...noteFields,
    ...standingSchema.shape,
    posts: z.array(postSchema),
    events: z.array(noteEventSchema),
  })
  .meta({ id: 'Note' })
export type Note = z.output<typeof noteSchema>

const byScene = z.object({ id: idSchema })
const number = z.coerce.number().int().min(1).max(1_000_000)
const byNumber = z.object({ id: idSchema, number })
const byPost = z.object({ id: idSchema, number, post: number })
/** The version it is looked at in; default: the scene's head. */
const seenIn = z.object({ version: number.optional() })

const filterFields = {
  /** Notes made on versions up to this one, each as it stands in it; default: the scene's head. */
  version: number.optional(),
  /** Made on exactly this version. */
  madeOn: number.optional(),
  state: z.enum(noteStates).optional(),
  kind: z.enum(noteKinds).optional(),
  /** A person's id, or `guest` for all guests. */
  author: z.union([idSchema, z.literal('guest')]).optional(),
  part: z.string().max(120).optional(),
}
export const noteFilterSchema = z.object(filterFields)
export type NoteFilter = z.output<typeof noteFilterSchema>

export const noteCountsSchema = z.object({
  all: count,
  open: count,
  settled: count,
  kinds: z.record(z.enum(noteKinds), count),
  /** Open ones of kind error. */
  openErrors: count,
})
export type NoteCounts = z.output<typeof noteCountsSchema>

const summaryOfChange = 'its revision has moved on, or its state is not the one this needs'

export const listNotes = operation({
  id: 'listNotes',
  method: 'GET',
  path: '/api/v1/scenes/{id}/notes',
  summary: 'Notes of a scene by number, a page at a time, with the counts of all that match',
  for: 'person',
  limit: 'reading',
  params: byScene,
  query: z.object({
    ...filterFields,
    /** The number where the last page ended. */
    after: number.optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  status: 200,
  answer: z.object({
    /** The version that they are looked at in. */
    version: ordinal,
    notes: z.array(noteSummarySchema),
    counts: noteCountsSchema,
    /** Everybody who has written a note here, for the filter; guests together. */
    authors: z.array(z.object({ id: z.union([idSchema, z.literal('guest')]), name: z.string() })),
    next: ordinal.nullable(),
  }),
})

export const readNote = operation({
  id: 'readNote',
  method: 'GET',
  path: '/api/v1/scenes/{id}/notes/{number}',
  summary: 'A note with its thread and what became of it',
  for: 'person',
  limit: 'reading',
  params: byNumber,
  query: seenIn,
  status: 200,
  answer: z.object({ note: noteSchema }),
})

export const makeNote = operation({
  id: 'makeNote',
  method: 'POST',
  path: '/api/v1/scenes/{id}/notes',
  summary: 'Pin a note to a part of a saved version',
  for: 'person',
  limit: 'writing',
  params: byScene,
  body: z.object({
    anchor: anchorSchema,
    kind: z.enum(noteKinds),
    heading: headingSchema.default(''),
    words: wordsSchema,
    /** People of the workshop named in the words with an @ before their name. */
    mentions: mentionsSchema.default([]),
    drawing: stillDrawingSchema.nullable().default(null),
  }),
  idempotent: true,
  status: 201,
  answer: z.object({ note: noteSchema }),
})

export const changeNote = operation({
  id: 'changeNote',
  method: 'PATCH',
  path: '/api/v1/scenes/{id}/notes/{number}',
  summary: `Change a note's kind, or within ${editMinutes} minutes its heading`,
  for: 'person',
  limit: 'writing',
  params: byNumber,
  body: z.object({
    revision: ordinal,
    kind: z.enum(noteKinds).optional(),
    heading: headingSchema.optional(),
  }),
  status: 200,
  answer: z.object({ note: noteSchema }),
  problems: { 409: `Somebody was there first: ${summaryOfChange}` },
})

export const replyToNote = operation({
  id: 'replyToNote',
  method: 'POST',
  path: '/api/v1/scenes/{id}/notes/{number}/posts',
  summary: 'Reply to a note',
  for: 'person',
  limit: 'writing',
  params: byNumber,
  body: z.object({
    words: wordsSchema,
    mentions: mentionsSchema.default([]),
    drawing: stillDrawingSchema.nullable().default(null),
  }),
  idempotent: true,
  status: 201,
  answer: z.object({ note: noteSchema }),
})

export const editPost = operation({
  id: 'editPost',
  method: 'PATCH',
  path: '/api/v1/scenes/{id}/notes/{number}/posts/{post}',
  summary: `Change what one's own post says, within ${editMinutes} minutes`,
  for: 'person',
  limit: 'writing',
  params: byPost,
  body: z.object({
    revision: ordinal,
    words: wordsSchema,
    mentions: mentionsSchema.default([]),
    /** Left out: as it was. Null: none any more. */
    drawing: stillDrawingSchema.nullable().optional(),
  }),
  status: 200,
  answer: z.object({ note: noteSchema }),
  problems: { 409: 'It was changed meanwhile: the answer has what it says now (`now`) and yours (`yours`)' },
})

export const deletePost = operation({
  id: 'deletePost',
  method: 'DELETE',
  path: '/api/v1/scenes/{id}/notes/{number}/posts/{post}',
  summary: 'Empty a post; that it was there is still seen',
  for: 'person',
  limit: 'writing',
  params: byPost,
  status: 200,
  answer: z.object({ note: noteSchema }),
})

const saidWith = z.string().trim().max(mostOfNotes.reason).default('')

export const settleNote = operation({
  id: 'settleNote',
  method: 'POST',
  path: '/api/v1/scenes/{id}/notes/{number}/settle',
  summary: 'Settle an open note, with the reason',
  for: 'person',
  limit: 'writing',
  params: byNumber,
  body: z.object({ settlement: settlementSchema, words: saidWith }),
  status: 200,
  answer: z.object({ note: noteSchema }),
  problems: { 409: 'Somebody has settled it already: the answer has the note as it is now (`note`)' },
})

export const reopenNote = operation({
  id: 'reopenNote',
  method: 'POST',
  path: '/api/v1/scenes/{id}/notes/{number}/reopen',
  summary: 'Open a settled note again; what it was settled with is kept',
  for: 'person',
  limit: 'writing',
  params: byNumber,
  body: z.object({ words: saidWith }),
  status: 200,
  answer: z.object({ note: noteSchema }),
  problems: { 409: 'It is open already' },
})

export const moveNote = operation({
  id: 'moveNote',
  method: 'POST',
  path: '/api/v1/scenes/{id}/notes/{number}/move',
  summary: 'Pin a note again, in another version or at another place; where it was is kept',
  for: 'person',
  limit: 'writing',
  params: byNumber,
  body: z.object({ revision: ordinal, anchor: anchorSchema }),
  status: 200,
  answer: z.object({ note: noteSchema }),
  problems: { 409: `Somebody was there first: ${summaryOfChange}` },
})

export const notesAsCsv = operation({
  id: 'notesAsCsv',
  method: 'GET',
  path: '/api/v1/scenes/{id}/notes.csv',
  summary: 'All notes that match with their threads, by number, for a spreadsheet',
  for: 'person',
  limit: 'printing',
  params: byScene,
  query: noteFilterSchema,
  status: 200,
  media: 'text/csv',
})

export const notesAsJson = operation({
  id: 'notesAsJson',
  method: 'GET',
  path: '/api/v1/scenes/{id}/notes.json',
  summary: 'All notes that match with their threads and events, by number',
  for: 'person',
  limit: 'printing',
  params: byScene,
  query: noteFilterSchema,
  status: 200,
  answer: z.object({
    scene: z.string(),
    workshop: z.string(),
    version: ordinal,
    notes: z.array(noteSchema),
  }),
})

export const noteOperations = [
  listNotes,
  makeNote,
  readNote,
  changeNote,
  replyToNote,
  editPost,
  deletePost,
  settleNote,
  reopenNote,
  moveNote,
  notesAsCsv,
  notesAsJson,
]
