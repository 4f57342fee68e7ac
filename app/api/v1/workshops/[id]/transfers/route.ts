import { transferWorkshop as contract } from '@/lib/contracts/workshops'
import { handle } from '@/lib/http/handle'
import { transferWorkshop } from '@/lib/services/transfer-workshop'

export const POST = handle(contract, ({ person, params, body }) => transferWorkshop(person, params.id, body))
