import * as contracts from '@/lib/contracts/account'
import { sessionTokenOf } from '@/lib/http/caller'
import { handle } from '@/lib/http/handle'
import { endOtherSessions } from '@/lib/services/end-sessions'
import { listSessions } from '@/lib/services/list-sessions'

export const GET = handle(contracts.listSessions, async ({ request, person }) => ({
  sessions: await listSessions(person, sessionTokenOf(request)),
}))

export const DELETE = handle(contracts.endOtherSessions, async ({ request, person }) => ({
  ended: await endOtherSessions(person, sessionTokenOf(request)),
}))
