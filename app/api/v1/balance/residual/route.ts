import { residualBalance as contract } from '@/lib/contracts/balance'
import { handle } from '@/lib/http/handle'
import { residualBalance } from '@/lib/services/residual-balance'

export const POST = handle(contract, async ({ body }) => residualBalance(body))
