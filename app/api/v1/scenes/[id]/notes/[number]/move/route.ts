import { moveNote as contract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { moveNote } from '@/lib/services/notes/move-note'

export const POST = handle(contract, async ({ person, params, body }) => ({
  note: await moveNote(person, params.id, params.number, body),
}))
