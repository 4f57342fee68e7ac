import { modelOf } from '@/lib/contracts/models'
import { modelMedia } from '@/lib/export/model-file'
import { handle } from '@/lib/http/handle'
import { modelOfTrain } from '@/lib/services/model-of-train'
import { fileResponse } from '../file-response'
import { inkThemes } from '@/lib/pictures/scene-picture'

export const POST = handle(modelOf, async ({ body }) =>
  fileResponse(await modelOfTrain(body, inkThemes.light), modelMedia[body.form], `crank-train.${body.form}`),
)
