import { reopenNote as contract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { reopenNote } from '@/lib/services/notes/reopen-note'

export const POST = handle(contract, async ({ person, params, body }) => ({
  note: await reopenNote(person, params.id, params.number, body.words),
}))
