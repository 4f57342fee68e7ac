import { listClearances } from '@/lib/contracts/clearances'
import { handle } from '@/lib/http/handle'
import { listClearances as list } from '@/lib/services/list-clearances'

export const POST = handle(listClearances, async ({ body }) => list(body))
