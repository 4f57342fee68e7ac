import { replyToNote as contract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { replyToNote } from '@/lib/services/notes/reply-to-note'

export const POST = handle(contract, async ({ person, params, body, idempotencyKey }) => ({
  note: await replyToNote(person, params.id, params.number, body, idempotencyKey),
}))
