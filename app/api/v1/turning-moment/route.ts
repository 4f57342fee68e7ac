import { turningMoment } from '@/lib/contracts/turning-moment'
import { handle } from '@/lib/http/handle'
import { tellTurningMoment } from '@/lib/services/tell-turning-moment'

export const POST = handle(turningMoment, async ({ body }) => tellTurningMoment(body))
