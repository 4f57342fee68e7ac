import { auditJson } from '@/lib/contracts/audit-log'
import { handle } from '@/lib/http/handle'
import { exportAudit } from '@/lib/services/audit-log'

export const GET = handle(auditJson, async ({ person, params, query, headers }) => {
  headers.set('content-disposition', 'attachment; filename="audit-log.json"')
  return { entries: await exportAudit(person, params.id, query) }
})
