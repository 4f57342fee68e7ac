import * as contracts from '@/lib/contracts/scenes'
import { handle } from '@/lib/http/handle'
import { listVersions } from '@/lib/services/list-versions'
import { saveVersion } from '@/lib/services/save-version'

export const GET = handle(contracts.listVersions, ({ person, params, query }) =>
  listVersions(person, params.id, query),
)

export const POST = handle(contracts.saveVersion, ({ person, params, body, idempotencyKey }) =>
  saveVersion(person, params.id, body, idempotencyKey),
)
