import { renamePerson as contract } from '@/lib/contracts/account'
import { handle } from '@/lib/http/handle'
import { renamePerson } from '@/lib/services/change-account'

export const PATCH = handle(contract, ({ person, body }) => renamePerson(person, body.name))
