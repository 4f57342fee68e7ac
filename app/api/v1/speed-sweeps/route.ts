import { speedSweep } from '@/lib/contracts/speed-sweeps'
import { handle } from '@/lib/http/handle'
import { sweepTrainSpeeds } from '@/lib/services/sweep-speeds'

export const POST = handle(speedSweep, async ({ body }) => sweepTrainSpeeds(body))
