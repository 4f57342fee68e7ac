import { bearingLoads } from '@/lib/contracts/bearing-loads'
import { handle } from '@/lib/http/handle'
import { listBearingLoads } from '@/lib/services/list-bearing-loads'

export const POST = handle(bearingLoads, async ({ body }) => listBearingLoads(body))
