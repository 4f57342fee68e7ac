import { settleNote as contract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { settleNote } from '@/lib/services/notes/settle-note'

export const POST = handle(contract, async ({ person, params, body }) => ({
  note: await settleNote(person, params.id, params.number, body),
}))
