import type { Rig } from '@/scene/frame/types'
import type { Scene } from '@/scene/model/scene'
import type { Balloon } from '@/scene/stage/types'
import { numberedRows, rowKey, type NumberedRow } from './part-rows'

const rowsOf = (scene: Scene) => numberedRows(scene).flatMap(({ rows }) => rows)

const partsOf = (rig: Rig, { row }: NumberedRow): string[] => {
  const kinds = row.kinds ?? []
  return rig.parts.filter(({ kind }) => kinds.includes(kind)).map(({ id }) => id)
}

/** The numbers that stand on the drawing: those of the main rows, and of any row that is chosen or refused. */
export function balloonsOf(rig: Rig, scene: Scene, lit: string | null, refused: Set<string>): Balloon[] {
  return rowsOf(scene).flatMap((numbered) => {
    const parts = partsOf(rig, numbered)
    const key = rowKey(numbered.row)
    const state = refused.has(key) ? 'bad' : key === lit ? 'on' : 'plain'
    if (parts.length === 0 || (!numbered.row.balloon && state === 'plain')) return []
    return [{ number: numbered.number, parts, state } satisfies Balloon]
  })
}

export function partsOfRow(rig: Rig, scene: Scene, key: string): string[] {
  const numbered = rowsOf(scene).find(({ row }) => rowKey(row) === key)
  return numbered ? partsOf(rig, numbered) : []
}

export function rowOfPart(rig: Rig, scene: Scene, part: string): string | null {
  const kind = rig.parts.find(({ id }) => id === part)?.kind
  const rows = kind ? rowsOf(scene).filter(({ row }) => row.kinds?.includes(kind)) : []
  const numbered = rows.find(({ row }) => row.balloon) ?? rows[0]
  return numbered ? rowKey(numbered.row) : null
}

export function rowOfBalloon(scene: Scene, number: number): string | null {
  const numbered = rowsOf(scene).find((candidate) => candidate.number === number)
  return numbered ? rowKey(numbered.row) : null
}
