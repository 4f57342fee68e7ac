import type { Transaction } from '@/db/client'
import { openErrorNumbers } from '@/db/queries/notes'

/** Numbers of the notes that hold up an approval of this version: open errors made on it or on one before it. */
export const openErrors = (tx: Transaction, sceneId: string, version: number): Promise<number[]> =>
  openErrorNumbers(tx, sceneId, version)
