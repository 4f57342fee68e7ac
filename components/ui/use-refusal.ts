'use client'

import { useState } from 'react'

interface Refused {
  problem: { detail: string; cure: string; issues?: { path: string; message: string; fix: string }[] }
}

const isRefused = (error: unknown): error is Error & Refused => error instanceof Error && 'problem' in error

/** Runs what may be refused by the server, and keeps the words of the refusal to stand beside the typed text. */
export function useRefusal() {
  const [refused, setRefused] = useState<Refused['problem'] | null>(null)
  const [busy, setBusy] = useState(false)
  const run = async (work: () => Promise<void>) => {
    setBusy(true)
    setRefused(null)
    try {
      await work()
    } catch (error) {
      if (!isRefused(error)) throw error
      setRefused(error.problem)
    } finally {
      setBusy(false)
    }
  }
  const issue = refused?.issues?.[0]
  const words = refused && (issue ? `${issue.message} ${issue.fix}` : `${refused.detail} ${refused.cure}`)
  return { run, busy, words, field: issue?.path ?? null }
}
