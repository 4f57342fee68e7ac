import { listAudit as contract } from '@/lib/contracts/audit-log'
import { handle } from '@/lib/http/handle'
import { listAudit } from '@/lib/services/audit-log'

export const GET = handle(contract, ({ person, params, query }) => listAudit(person, params.id, query))
