import type { Scene } from '@/scene/model/scene'
import { readOnce } from './judge'
import { sameTrain } from './same-train'
import type { Base, Saved, Session } from './session'
import type { Clock } from './clock'

/** The scene as it stands this moment, with the angle of the clock in it. */
export function snapshot(session: Session, clock: Clock): Scene {
  const { scene } = session.getState()
  const angleDeg = Number(((clock.angle * 180) / Math.PI).toFixed(2))
  return { ...scene, view: { ...scene.view, angleDeg, playing: clock.playing } }
}

export interface KeptDraft {
  scene: Scene
  base: Base
  saved: Saved | null
  keptAt: number
}

type Store = Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>

const keyOf = (sceneId: string | null) => `counterthrow.draft.${sceneId ?? 'new'}`

/** What was left in this browser for a scene, or for work that is no scene yet. Nothing, where it does not read any more. */
export function readKept(store: Store, sceneId: string | null): KeptDraft | null {
  try {
    const text = store.getItem(keyOf(sceneId))
    if (!text) return null
    const kept = JSON.parse(text) as KeptDraft
    return kept.scene?.format === 'scene/1' && readOnce(kept.scene.train).ok && kept.base?.train ? kept : null
  } catch {
    return null
  }
}

export function writeKept(store: Store, kept: KeptDraft): boolean {
  try {
    store.setItem(keyOf(kept.saved?.sceneId ?? null), JSON.stringify(kept))
    return true
  } catch {
    return false
  }
}

export const dropKept = (store: Store, sceneId: string | null) => store.removeItem(keyOf(sceneId))

interface Keeping {
  store: Store
  session: Session
  clock: Clock
  onKept(at: number): void
  /** Where somebody is signed in: the same on the server, less often. */
  remote?(scene: Scene, saved: Saved | null): Promise<void>
}

const HERE_MS = 300
const THERE_MS = 3000

/** Keeps the draft a moment after every change: at once here, a little later on the server. Returns how to stop. */
export function keepDraft({ store, session, clock, onKept, remote }: Keeping): () => void {
  let here: ReturnType<typeof setTimeout> | undefined
  let there: ReturnType<typeof setTimeout> | undefined
  const keepHere = () => {
    here = undefined
    const { base, saved } = session.getState()
    const keptAt = Date.now()
    if (writeKept(store, { scene: snapshot(session, clock), base, saved, keptAt })) onKept(keptAt)
  }
  const keepThere = () => {
    there = undefined
    const { saved } = session.getState()
    // A draft that cannot be sent is still here; the next change tries again.
    remote?.(snapshot(session, clock), saved).catch(() => undefined)
  }
  const stop = session.subscribe((state, before) => {
    if (state.scene === before.scene && state.saved === before.saved) return
    here ??= setTimeout(keepHere, HERE_MS)
    if (remote && state.scene.train !== before.scene.train) {
      clearTimeout(there)
      there = setTimeout(keepThere, THERE_MS)
    }
  })
  /** Whoever leaves finds the bench as it stood, also where nothing was typed; a version that is only looked at needs no draft. */
  const flush = () => {
    const { scene, saved } = session.getState()
    if (here === undefined && saved && sameTrain(saved.scene.train, scene.train)) return
    clearTimeout(here)
    keepHere()
  }
  window.addEventListener('pagehide', flush)
  return () => {
    stop()
    flush()
    clearTimeout(there)
    window.removeEventListener('pagehide', flush)
  }
}
