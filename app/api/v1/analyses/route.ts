import { analyse } from '@/lib/contracts/analyses'
import { handle } from '@/lib/http/handle'
import { analyseTrain } from '@/lib/services/analyse-train'

export const POST = handle(analyse, async ({ body }) => analyseTrain(body))
