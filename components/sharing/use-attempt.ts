'use client'

import { useState } from 'react'
import { Refusal } from '@/lib/contracts/call'

/** Runs what may be refused, and keeps the refusal until the next run. */
export function useAttempt() {
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const [busy, setBusy] = useState(false)
  const attempt = async (act: () => Promise<void>) => {
    setRefusal(null)
    setBusy(true)
    try {
      await act()
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      setRefusal(error)
    } finally {
      setBusy(false)
    }
  }
  const issues = refusal?.problem.issues ?? []
  return {
    ...{ attempt, busy, issues },
    /** What no field says itself. */
    words: refusal && issues.length === 0 ? `${refusal.problem.detail} ${refusal.problem.cure}` : null,
  }
}
