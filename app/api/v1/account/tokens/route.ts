import { listApiTokens as contract } from '@/lib/contracts/tokens'
import { handle } from '@/lib/http/handle'
import { listApiTokens } from '@/lib/services/list-api-tokens'

export const GET = handle(contract, async ({ person }) => ({ tokens: await listApiTokens(person) }))
