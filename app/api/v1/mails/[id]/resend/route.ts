import { resendMail as contract } from '@/lib/contracts/mail'
import { handle } from '@/lib/http/handle'
import { resendMail } from '@/lib/services/mail/resend-mail'

export const POST = handle(contract, async ({ person, params }) => ({
  mail: await resendMail(person, params.id),
}))
