import type { Scene } from '@/scene/model/scene'
import { newScene } from '@/scene/model/default-scene'
import { readScene } from '@/scene/model/read-scene'
import type { Issue } from './judge'
import { readOnce } from './judge'

export type FileAnswer = { ok: true; scene: Scene } | { ok: false; issues: Issue[] }

/** A file that was brought in: a scene, or a crank train alone, which gets the usual view. */
export function readFile(text: string): FileAnswer {
  let json: unknown
  try {
    json = JSON.parse(text)
  } catch {
    return refused(
      '',
      'unreadable',
      'This file is not JSON.',
      'Choose a file that was downloaded from a bench.',
    )
  }
  const format = json !== null && typeof json === 'object' && 'format' in json ? String(json.format) : ''
  if (format.startsWith('crank-train/')) {
    const read = readOnce(json as Scene['train'])
    return read.ok ? { ok: true, scene: newScene(read.document) } : read
  }
  if (format.startsWith('scene/')) {
    const read = readScene(json)
    return read.ok ? { ok: true, scene: read.scene } : read
  }
  return refused(
    'format',
    'unknown-format',
    'This is neither a scene nor a crank train.',
    'Its "format" should be "scene/1" or "crank-train/1".',
  )
}

const refused = (path: string, code: string, message: string, fix: string): FileAnswer => ({
  ok: false,
  issues: [{ path, code, message, fix }],
})
