import * as contracts from '@/lib/contracts/workshops'
import { handle } from '@/lib/http/handle'
import { changeRole } from '@/lib/services/change-role'
import { removePerson } from '@/lib/services/remove-person'

export const PATCH = handle(contracts.changeRole, ({ person, params, body }) =>
  changeRole(person, params.id, params.person, body.role),
)

export const DELETE = handle(contracts.removePerson, ({ person, params }) =>
  removePerson(person, params.id, params.person),
)
