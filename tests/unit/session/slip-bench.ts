import { expect } from 'vitest'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import { getAt } from '@/scene/session/path'
import { createSession } from '@/scene/session/session'

export type Session = ReturnType<typeof createSession>

/** A bench with a preset, changed before anything is typed. */
export const start = (preset: string, edits: [string, unknown][] = []) => {
  const session = createSession({ scene: newScene(presetById(preset)!.train) })
  for (const [path, value] of edits)
    expect(session.edit([{ path: ['train', ...keys(path)], value }]), path).toBe(true)
  return session
}
const keys = (path: string) => path.split('.').map((step) => (/^\d+$/.test(step) ? Number(step) : step))
export const at = (session: Session, path: string) =>
  getAt(session.getState().scene, ['train', ...keys(path)])

export const literal = (text: string) => new RegExp(text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'))
