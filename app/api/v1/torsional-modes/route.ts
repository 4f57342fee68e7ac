import { torsionalModes } from '@/lib/contracts/torsional-modes'
import { handle } from '@/lib/http/handle'
import { tellTorsionalModes } from '@/lib/services/tell-torsional-modes'

export const POST = handle(torsionalModes, async ({ body }) => tellTorsionalModes(body))
