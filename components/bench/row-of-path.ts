import type { Scene } from '@/scene/model/scene'
import { rowKey, type NumberedRow } from './part-rows'

/** Tables hold what no row of its own holds. */
const tableOf: Record<string, string> = {
  banks: 'table.banks',
  throws: 'table.throws',
  cylinders: 'table.cylinders',
  counterweights: 'table.counterweights',
}

/** The row of the parts list in which a value of the train stands: "masses.rod.massKg", "throws.2.angleDeg". */
export function rowOfPath(path: string, rows: readonly NumberedRow[], { train }: Scene): string | null {
  const keys = new Set(rows.map(({ row }) => rowKey(row)))
  const own = rows.find(({ row }) => row.is === 'figure' && row.field.path === path)
  if (own) return rowKey(own.row)
  if (keys.has(path)) return path
  const [list, index, field] = path.split('.')
  if (path === 'throws.axialMm') return keys.has('throwPitch') ? 'throwPitch' : 'table.throws'
  if (list === 'throws' && field === 'angleDeg') return 'throws'
  if (list === 'cylinders' && field && index && field in (train.cylinders[Number(index)] ?? {}))
    return 'table.unequal'
  return tableOf[list] ?? null
}
