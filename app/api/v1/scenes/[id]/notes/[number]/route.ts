import { changeNote as changeContract, readNote as readContract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { changeNote } from '@/lib/services/notes/change-note'
import { readNote } from '@/lib/services/notes/read-note'

export const GET = handle(readContract, async ({ person, params, query }) => ({
  note: await readNote(person, params.id, params.number, query.version),
}))

export const PATCH = handle(changeContract, async ({ person, params, body }) => ({
  note: await changeNote(person, params.id, params.number, body),
}))
