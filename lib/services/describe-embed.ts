import { config } from '@/lib/config'
import { frameHtml } from '@/lib/contracts/frame-html'
import type { AnswerOf, QueryOf } from '@/lib/contracts/operation'
import type { embedDescription as contract } from '@/lib/contracts/shared'
import { linkUnavailable } from '@/lib/errors/problem'
import { lookThroughShareLink } from './open-share-link'

const usual = { width: 960, height: 640 }
const card = { width: 1200, height: 630 }

/** The token in the address of a link's page here; null for any other address. */
function tokenIn(address: string): string | null {
  const { origin } = config()
  const found = address.startsWith(`${origin}/s/`) && /^\/s\/([\w-]+)\/?$/.exec(address.slice(origin.length))
  return found ? found[1] : null
}

/** oEmbed 1.0 (oembed.com): only what some site may frame is told of, and only without a password. */
export async function describeEmbed(query: QueryOf<typeof contract>): Promise<AnswerOf<typeof contract>> {
  const token = tokenIn(query.url)
  if (token === null) throw linkUnavailable()
  const { title, workshop, framable } = await lookThroughShareLink({ token, pass: null })
  if (!framable) throw linkUnavailable()
  const { origin } = config()
  const width = Math.min(usual.width, query.maxwidth ?? usual.width)
  const height = Math.min(usual.height, query.maxheight ?? usual.height)
  return {
    ...{ version: '1.0', type: 'rich', title, width, height },
    ...{ provider_name: workshop, provider_url: origin },
    html: frameHtml(`${origin}/s/${token}`, title, width, height),
    thumbnail_url: `${origin}/api/v1/shared/${token}/card.png`,
    ...{ thumbnail_width: card.width, thumbnail_height: card.height },
  }
}
