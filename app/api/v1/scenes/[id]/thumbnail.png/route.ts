import { sceneThumbnail } from '@/lib/contracts/scenes'
import { handle } from '@/lib/http/handle'
import { pictureResponse } from '@/lib/http/picture-response'
import { openScene } from '@/lib/services/open-scene'
import { thumbnail } from '@/lib/services/pictures/thumbnail'

export const GET = handle(sceneThumbnail, async ({ request, person, params, query }) => {
  const { version } = await openScene(person, params.id, query.version)
  return pictureResponse(request, `thumbnail ${params.id} ${version.number} ${query.theme}`, () =>
    thumbnail(params.id, version.number, query.theme, version.document),
  )
})
