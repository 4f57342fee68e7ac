import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import type { Scene } from '@/scene/model/scene'
import { createClock } from '@/scene/session/clock'
import { readKept } from '@/scene/session/draft'
import { keepUnits, readUnits } from '@/scene/session/kept-units'
import type { BenchTools } from '@/scene/session/react'
import { createSession, type Base, type Saved } from '@/scene/session/session'

/** Where the bench begins, as its address and the server say. */
export interface BenchStart {
  /** A stored scene that was asked for. */
  opened: { sceneId: string; version: number; head: number; document: Scene } | null
  /** That version was asked for by its number: it lies on top of work that was left. */
  asked?: boolean
  /** The person's own unsaved work on it (or on nothing yet), as the server has it. */
  draft: { document: Scene; base: number | null; updatedAt: string } | null
  preset: string | null
  fresh: boolean
}

const FIRST = 'v8x-5000'

/** The session and clock of one visit: work that was left is taken up; a preset asked for is laid on top of it. */
export function begin({ opened, asked, draft, preset, fresh }: BenchStart): BenchTools {
  const system = readUnits(localStorage)
  const saved: Saved | null = opened && {
    sceneId: opened.sceneId,
    version: opened.version,
    scene: opened.document,
  }
  const first = opened?.document ?? newScene(presetById(FIRST)!.train)
  const base: Base = { train: first.train, word: opened ? 'version' : 'preset' }
  const session = createSession({ scene: first, base, saved, system })

  const kept = readKept(localStorage, opened?.sceneId ?? null)
  const remote = draft && { ...draft, keptAt: Date.parse(draft.updatedAt) }
  if (kept && kept.keptAt >= (remote?.keptAt ?? 0)) session.takeUp(kept)
  else if (remote)
    session.takeUp({
      scene: remote.document,
      base: { train: first.train, word: base.word },
      saved: saved && { ...saved, version: remote.base ?? saved.version },
    })
  const wanted = preset ? presetById(preset) : fresh ? presetById(FIRST) : undefined
  if (wanted) session.open(newScene(wanted.train), 'preset')

  if (asked && saved && session.getState().scene !== saved.scene) session.open(saved.scene, 'version', saved)

  session.subscribe((state, before) => {
    if (state.system !== before.system) keepUnits(localStorage, state.system)
  })
  const clock = createClock()
  return { session, clock }
}

/** Sets the clock as a scene was left: at its angle, and running if it ran and motion is welcome. */
export function setClock({ session, clock }: BenchTools): void {
  const { scene } = session.getState()
  clock.setCycle(scene.train.cycle === 'two-stroke' ? 2 * Math.PI : 4 * Math.PI)
  clock.setAngle((scene.view.angleDeg * Math.PI) / 180)
  if (scene.view.playing && !window.matchMedia('(prefers-reduced-motion: reduce)').matches) clock.play()
  else clock.pause()
}
