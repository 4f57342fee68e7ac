import { groupCollectors } from '@/lib/contracts/firing'
import { handle } from '@/lib/http/handle'
import { groupCollectors as group } from '@/lib/services/group-collectors'

export const POST = handle(groupCollectors, async ({ body }) => group(body))
