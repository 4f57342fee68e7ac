import * as contracts from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { createShareLink } from '@/lib/services/create-share-link'
import { listShareLinks } from '@/lib/services/list-share-links'

export const GET = handle(contracts.listShareLinks, async ({ person, params }) => ({
  links: await listShareLinks(person, params.id),
}))

export const POST = handle(contracts.createShareLink, ({ person, params, body }) =>
  createShareLink(person, params.id, body),
)
