import * as contracts from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { changeShareLink } from '@/lib/services/change-share-link'
import { revokeShareLink } from '@/lib/services/revoke-share-link'

export const PATCH = handle(contracts.changeShareLink, async ({ person, params, body }) => ({
  link: await changeShareLink(person, params.id, body),
}))

export const DELETE = handle(contracts.revokeShareLink, async ({ person, params }) => ({
  link: await revokeShareLink(person, params.id),
}))
