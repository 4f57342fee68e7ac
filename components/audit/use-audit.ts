'use client'

import { usePages } from '@/components/ui/use-pages'
import type { AuditFilters, listAudit } from '@/lib/contracts/audit-log'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'

type Page = AnswerOf<typeof listAudit>

export const auditAddress = (workshop: string, kind: '' | '.csv' | '.json', query: object) =>
  addressOf(`/api/v1/workshops/{id}/audit-log${kind}`, { id: workshop }, query)

/** The audit log as far back as somebody asked. */
export function useAudit(workshop: string, filters: AuditFilters) {
  const { pages, error, more } = usePages<Page>(
    (before) => auditAddress(workshop, '', { ...filters, before }),
    readAddress,
  )
  return { entries: pages?.flatMap((page) => page.entries) ?? null, error, more }
}
