import { readTrace } from '@/lib/contracts/gas'
import { handle } from '@/lib/http/handle'
import { readTrace as read } from '@/lib/services/read-trace'

export const POST = handle(readTrace, async ({ body }) => read(body))
