import { auditCsv } from '@/lib/contracts/audit-log'
import { handle } from '@/lib/http/handle'
import { auditTable, exportAudit } from '@/lib/services/audit-log'
import { tableCsv } from '@/lib/tables/csv'
import { fileResponse } from '../../../file-response'

export const GET = handle(auditCsv, async ({ person, params, query }) => {
  const csv = tableCsv(auditTable(await exportAudit(person, params.id, query)))
  return fileResponse(new TextEncoder().encode(csv), 'text/csv; charset=utf-8', 'audit-log.csv')
})
