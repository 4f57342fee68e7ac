import { presetPoster } from '@/lib/contracts/scenes'
import { notFound } from '@/lib/errors/problem'
import { handle } from '@/lib/http/handle'
import { pictureResponse } from '@/lib/http/picture-response'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import { drawScene, posterSize } from '@/lib/pictures/scene-picture'

export const GET = handle(presetPoster, async ({ request, params, query }) => {
  const preset = presetById(params.id)
  if (!preset) throw notFound('preset')
  return pictureResponse(request, `preset ${preset.id} ${query.theme}`, () =>
    drawScene(newScene(preset.train), query.theme, posterSize),
  )
})
