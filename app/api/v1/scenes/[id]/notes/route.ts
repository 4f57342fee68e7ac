import { listNotes as listContract, makeNote as makeContract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { listNotes } from '@/lib/services/notes/list-notes'
import { makeNote } from '@/lib/services/notes/make-note'

export const GET = handle(listContract, ({ person, params, query }) => listNotes(person, params.id, query))

export const POST = handle(makeContract, async ({ person, params, body, idempotencyKey }) => ({
  note: await makeNote(person, params.id, body, idempotencyKey),
}))
