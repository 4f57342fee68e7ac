import { resetPassword as contract } from '@/lib/contracts/people'
import { handle } from '@/lib/http/handle'
import { resetPassword } from '@/lib/services/reset-password'

export const POST = handle(contract, ({ body }) => resetPassword(body.token, body.password))
