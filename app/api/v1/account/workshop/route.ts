import { chooseWorkshop as contract } from '@/lib/contracts/account'
import { handle } from '@/lib/http/handle'
import { chooseWorkshop } from '@/lib/services/choose-workshop'

export const PUT = handle(contract, ({ person, body }) => chooseWorkshop(person, body.workshop))
