import { openShareLink as contract } from '@/lib/contracts/shared'
import { handle } from '@/lib/http/handle'
import { linkKeyOf } from '@/lib/http/link-key'
import { openShareLink } from '@/lib/services/open-share-link'

export const GET = handle(contract, ({ request, params }) => openShareLink(linkKeyOf(request, params.token)))
