import * as contracts from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { eraseOpenings, listOpenings } from '@/lib/services/link-openings'

export const GET = handle(contracts.listOpenings, ({ person, params, query }) =>
  listOpenings(person, params.id, query),
)

export const DELETE = handle(contracts.eraseOpenings, ({ person, params }) =>
  eraseOpenings(person, params.id),
)
