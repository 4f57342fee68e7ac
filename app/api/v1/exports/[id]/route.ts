import { readExport as contract } from '@/lib/contracts/exports'
import { handle } from '@/lib/http/handle'
import { readExport } from '@/lib/services/exports/read-export'

export const GET = handle(contract, ({ person, params }) => readExport(person, params.id))
