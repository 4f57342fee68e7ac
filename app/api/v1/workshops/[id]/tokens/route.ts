import { createApiToken as contract } from '@/lib/contracts/tokens'
import { handle } from '@/lib/http/handle'
import { createApiToken } from '@/lib/services/create-api-token'

export const POST = handle(contract, ({ person, params, body }) => createApiToken(person, params.id, body))
