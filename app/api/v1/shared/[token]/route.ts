import { openShareLink as contract } from '@/lib/contracts/share-links'
import { handle } from '@/lib/http/handle'
import { openShareLink } from '@/lib/services/open-share-link'

export const GET = handle(contract, ({ params }) => openShareLink(params.token))
