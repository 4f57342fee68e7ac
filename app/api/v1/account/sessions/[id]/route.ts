import { endOneSession as contract } from '@/lib/contracts/account'
import { handle } from '@/lib/http/handle'
import { endOneSession } from '@/lib/services/end-sessions'

export const DELETE = handle(contract, ({ person, params }) => endOneSession(person, params.id))
