import { listPeople as contract } from '@/lib/contracts/workshops'
import { handle } from '@/lib/http/handle'
import { listPeople } from '@/lib/services/list-people'

export const GET = handle(contract, ({ person, params, query }) => listPeople(person, params.id, query))
