import { explain } from '@/lib/contracts/explanations'
import { handle } from '@/lib/http/handle'
import { explainFigure } from '@/lib/services/explain-figure'

export const POST = handle(explain, async ({ body }) => explainFigure(body))
