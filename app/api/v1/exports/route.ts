import { askExport as contract } from '@/lib/contracts/exports'
import { handle } from '@/lib/http/handle'
import { askExport } from '@/lib/services/exports/ask-export'

export const POST = handle(contract, ({ person, body }) => askExport(person, body))
