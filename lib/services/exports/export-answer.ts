import type { exportFiles } from '@/db/schema'
import { wantedSchema, type ExportAnswer } from '@/lib/contracts/exports'

export function exportAnswer(row: Omit<typeof exportFiles.$inferSelect, 'file'>): ExportAnswer {
  const { kind, sceneId, version } = wantedSchema.parse(row.wanted)
  return {
    ...{ id: row.id, kind, sceneId, version },
    ...{ state: row.state, reason: row.reason, fileName: row.fileName },
    fileUrl: row.state === 'made' ? `/api/v1/exports/${row.id}/file` : null,
    createdAt: row.createdAt.toISOString(),
    endsAt: row.endsAt.toISOString(),
  }
}
