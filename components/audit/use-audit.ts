'use client'

import useSWRInfinite from 'swr/infinite'
import type { AuditFilters, listAudit } from '@/lib/contracts/audit-log'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'

type Page = AnswerOf<typeof listAudit>

export const auditAddress = (workshop: string, kind: '' | '.csv' | '.json', query: object) =>
  addressOf(`/api/v1/workshops/{id}/audit-log${kind}`, { id: workshop }, query)

/** The audit log as far back as somebody asked. */
export function useAudit(workshop: string, filters: AuditFilters) {
  const { data, error, size, setSize } = useSWRInfinite<Page, Error>(
    (index: number, last: Page | null) =>
      last && last.next === null
        ? null
        : auditAddress(workshop, '', { ...filters, before: index > 0 ? last?.next : undefined }),
    readAddress,
    { keepPreviousData: true, dedupingInterval: 0 },
  )
  return {
    entries: data?.flatMap((page) => page.entries) ?? null,
    error,
    more: data?.at(-1)?.next ? () => void setSize(size + 1) : null,
  }
}
