import { leaveWorkshop as contract } from '@/lib/contracts/workshops'
import { handle } from '@/lib/http/handle'
import { leaveWorkshop } from '@/lib/services/leave-workshop'

export const DELETE = handle(contract, ({ person, params }) => leaveWorkshop(person, params.id))
