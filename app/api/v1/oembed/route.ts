import { embedDescription as contract } from '@/lib/contracts/shared'
import { handle } from '@/lib/http/handle'
import { describeEmbed } from '@/lib/services/describe-embed'

export const GET = handle(contract, ({ query }) => describeEmbed(query))
