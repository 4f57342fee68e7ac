'use client'

import useSWR from 'swr'
import { addressOf, readAddress } from '@/lib/contracts/call'

export interface Colleague {
  id: string
  name: string
  role: string
}

/** The people of the workshop who may be mentioned; asked for when somebody writes, not before. */
export function useColleagues(workshopId: string | null): Colleague[] {
  const { data } = useSWR<{ people: Colleague[] }, Error>(
    workshopId && addressOf('/api/v1/workshops/{id}/people', { id: workshopId }, { limit: 100 }),
    readAddress,
  )
  return data?.people ?? []
}
