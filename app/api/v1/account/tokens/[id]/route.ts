import { revokeApiToken as contract } from '@/lib/contracts/tokens'
import { handle } from '@/lib/http/handle'
import { revokeApiToken } from '@/lib/services/revoke-api-token'

export const DELETE = handle(contract, ({ person, params }) => revokeApiToken(person, params.id))
