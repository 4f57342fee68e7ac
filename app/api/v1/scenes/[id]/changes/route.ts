import { compareVersions as contract } from '@/lib/contracts/versions'
import { handle } from '@/lib/http/handle'
import { compareVersions } from '@/lib/services/compare-versions'

export const GET = handle(contract, ({ person, params, query }) => compareVersions(person, params.id, query))
