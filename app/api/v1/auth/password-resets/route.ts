import { requestPasswordReset as contract } from '@/lib/contracts/people'
import { handle } from '@/lib/http/handle'
import { requestPasswordReset } from '@/lib/services/request-password-reset'

export const POST = handle(contract, ({ body }) => requestPasswordReset(body.email))
