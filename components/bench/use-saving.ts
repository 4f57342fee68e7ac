'use client'

import { useState } from 'react'
import { call, Refusal } from '@/lib/contracts/call'
import type { dropDraft, dropSceneDraft } from '@/lib/contracts/drafts'
import type { createScene, SaveConflict, saveVersion } from '@/lib/contracts/scenes'
import type { Scene } from '@/scene/model/scene'
import { dropKept, snapshot } from '@/scene/session/draft'
import { useBench } from '@/scene/session/react'
import type { BenchPerson } from './person'

const key = () =>
  Array.from(crypto.getRandomValues(new Uint8Array(16)), (byte) => byte.toString(16).padStart(2, '0')).join(
    '',
  )

/** What is saved where somebody else saved in between. */
export interface Instead {
  document: Scene
  /** The version it comes on top of; null for a scene of its own. */
  onTopOf: number | null
}

export interface Saving {
  busy: boolean
  problem: string | null
  conflict: SaveConflict | null
  /** True once a version stands: of the scene on the bench, or of another document in its place. */
  save(message: string, instead?: Instead): Promise<boolean>
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

  const save = async (message: string, instead?: Instead): Promise<boolean> => {
    const { saved: open } = session.getState()
    const document = instead?.document ?? snapshot(session, clock)
    const saved = instead?.onTopOf === null ? null : open
    setBusy(true)
    setProblem(null)
    try {
      const answer = saved
        ? await call<typeof saveVersion>({
            method: 'POST',
            path: '/api/v1/scenes/{id}/versions',
            params: { id: saved.sceneId },
            body: { base: instead?.onTopOf ?? saved.version, message, document },
            key: attempt,
          })
        : await call<typeof createScene>({
            method: 'POST',
            path: '/api/v1/scenes',
            body: { workshop: person?.workshopId, message, document },
            key: attempt,
          })
      const { scene, version } = answer
      const stands = { sceneId: scene.id, version: version.number, scene: document }
      if (instead) session.open(document, 'version', stands)
      else session.markSaved(stands)
      dropKept(localStorage, open ? open.sceneId : null)
      setConflict(null)
      setAttempt(key())
      await forgetDraft(open ? open.sceneId : null)
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
