import { sharedCard } from '@/lib/contracts/shared'
import { handle } from '@/lib/http/handle'
import { linkKeyOf } from '@/lib/http/link-key'
import { pictureResponse } from '@/lib/http/picture-response'
import { lookThroughShareLink } from '@/lib/services/open-share-link'
import { cardSize, drawScene } from '@/lib/pictures/scene-picture'

export const GET = handle(sharedCard, async ({ request, params, query }) => {
  const { sceneId, version, document } = await lookThroughShareLink(linkKeyOf(request, params.token))
  return pictureResponse(request, `card ${sceneId} ${version} ${query.theme}`, () =>
    drawScene(document, query.theme, cardSize),
  )
})
