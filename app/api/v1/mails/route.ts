import { listMails as contract } from '@/lib/contracts/mail'
import { handle } from '@/lib/http/handle'
import { listMails } from '@/lib/services/mail/list-mails'

export const GET = handle(contract, ({ person, query }) => listMails(person, query))
