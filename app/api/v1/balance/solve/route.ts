import { solveBalance as contract } from '@/lib/contracts/balance'
import { handle } from '@/lib/http/handle'
import { solveBalance } from '@/lib/services/solve-balance'

export const POST = handle(contract, async ({ body }) => solveBalance(body))
