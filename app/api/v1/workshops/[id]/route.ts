import * as contracts from '@/lib/contracts/workshops'
import { handle } from '@/lib/http/handle'
import { changeWorkshop } from '@/lib/services/change-workshop'
import { readWorkshop } from '@/lib/services/read-workshop'

export const GET = handle(contracts.readWorkshop, ({ person, params }) => readWorkshop(person, params.id))

export const PATCH = handle(contracts.changeWorkshop, ({ person, params, body }) =>
  changeWorkshop(person, params.id, body),
)
