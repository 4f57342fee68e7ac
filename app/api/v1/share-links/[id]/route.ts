import { revokeShareLink as contract } from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { revokeShareLink } from '@/lib/services/revoke-share-link'

export const DELETE = handle(contract, async ({ person, params }) => ({
  link: await revokeShareLink(person, params.id),
}))
