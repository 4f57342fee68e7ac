'use client'

import { useState } from 'react'
import { call, Refusal } from '@/lib/contracts/call'
import type { dropDraft, dropSceneDraft } from '@/lib/contracts/drafts'
import type { createScene, SaveConflict, saveVersion } from '@/lib/contracts/scenes'
import { dropKept, snapshot } from '@/scene/session/draft'
import { useBench } from '@/scene/session/react'
import type { BenchPerson } from './person'

const key = () =>
  Array.from(crypto.getRandomValues(new Uint8Array(16)), (byte) => byte.toString(16).padStart(2, '0')).join(
    '',
  )

export interface Saving {
  busy: boolean
  problem: string | null
  conflict: SaveConflict | null
  /** True once a version stands. */
  save(message: string, onTopOf?: number): Promise<boolean>
  takeTheirs(): void
  forget(): void
}

/** Saves the scene as it stands as a new version; a save in between by somebody else is shown, never lost. */
export function useSaving(person: BenchPerson | null): Saving {
  const { session, clock } = useBench()
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState<string | null>(null)
  const [conflict, setConflict] = useState<SaveConflict | null>(null)
  // The same attempt sent twice is carried out once.
  const [attempt, setAttempt] = useState(key)

  const save = async (message: string, onTopOf?: number): Promise<boolean> => {
    const { saved } = session.getState()
    const document = snapshot(session, clock)
    setBusy(true)
    setProblem(null)
    try {
      const answer = saved
        ? await call<typeof saveVersion>({
            method: 'POST',
            path: '/api/v1/scenes/{id}/versions',
            params: { id: saved.sceneId },
            body: { base: onTopOf ?? saved.version, message, document },
            key: attempt,
          })
        : await call<typeof createScene>({
            method: 'POST',
            path: '/api/v1/scenes',
            body: { workshop: person?.workshopId, message, document },
            key: attempt,
          })
      const { scene, version } = answer
      session.markSaved({ sceneId: scene.id, version: version.number, scene: document })
      dropKept(localStorage, saved ? saved.sceneId : null)
      setConflict(null)
      setAttempt(key())
      await forgetDraft(saved ? saved.sceneId : null)
      return true
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      setAttempt(key())
      if (error.status === 409 && 'head' in error.problem)
        setConflict(error.problem as unknown as SaveConflict)
      else setProblem(`${error.problem.detail} ${error.problem.cure}`)
      return false
    } finally {
      setBusy(false)
    }
  }
  return {
    busy,
    problem,
    conflict,
    save,
    takeTheirs() {
      const saved = session.getState().saved
      if (!conflict || !saved) return
      const { number, document } = conflict.head
      session.open(document, 'version', { sceneId: saved.sceneId, version: number, scene: document })
      setConflict(null)
    },
    forget() {
      setConflict(null)
      setProblem(null)
    },
  }
}

/** The version stands: what was kept on the way to it is no longer wanted. Left behind it would only be older. */
async function forgetDraft(sceneId: string | null): Promise<void> {
  const forgotten = sceneId
    ? call<typeof dropSceneDraft>({
        method: 'DELETE',
        path: '/api/v1/scenes/{id}/draft',
        params: { id: sceneId },
      })
    : call<typeof dropDraft>({ method: 'DELETE', path: '/api/v1/draft' })
  await forgotten.catch(() => undefined)
}
