import { indexed } from '@/scene/model/change-words'
import type { SceneChange } from '@/scene/model/compare-scenes'
import type { Scene } from '@/scene/model/scene'
import { numberedRows, rowKey } from './part-rows'
import { rowOfPath } from './row-of-path'

/** The number of the row of the parts list in which a change of this scene stands; null where it has none there. */
export function rowNumber({ paths: [path] }: SceneChange, scene: Scene): number | null {
  if (path[0] !== 'train') return null
  const rows = numberedRows(scene).flatMap((group) => group.rows)
  const key = rowOfPath(indexed(path.slice(1), scene.train).join('.'), rows, scene)
  return rows.find(({ row }) => rowKey(row) === key)?.number ?? null
}
