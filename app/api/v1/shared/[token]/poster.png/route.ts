import { sharedPoster } from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { pictureResponse } from '@/lib/http/picture-response'
import { lookThroughShareLink } from '@/lib/services/open-share-link'
import { drawScene, posterSize } from '../../../scene-picture'

export const GET = handle(sharedPoster, async ({ request, params, query }) => {
  const { sceneId, version, document } = await lookThroughShareLink(params.token)
  return pictureResponse(request, `poster ${sceneId} ${version} ${query.theme}`, () =>
    drawScene(document, query.theme, posterSize),
  )
})
