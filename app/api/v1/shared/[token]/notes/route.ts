import { listGuestNotes as listContract, makeGuestNote as makeContract } from '@/lib/contracts/guest-notes'
import { handle } from '@/lib/http/handle'
import { linkKeyOf } from '@/lib/http/link-key'
import { listGuestNotes, makeGuestNote } from '@/lib/services/notes/guest-notes'

export const GET = handle(listContract, ({ request, params, query }) =>
  listGuestNotes(linkKeyOf(request, params.token), query),
)

export const POST = handle(makeContract, async ({ request, params, body }) => ({
  note: await makeGuestNote(linkKeyOf(request, params.token), body),
}))
