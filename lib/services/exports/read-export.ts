import { read, type Transaction } from '@/db/client'
import { exportById, fileOfExport } from '@/db/queries/exports'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { wantedSchema, type ExportAnswer } from '@/lib/contracts/exports'
import { notFound } from '@/lib/errors/problem'
import { exportAnswer } from './export-answer'
import { exportRight, type MadeFile } from './kinds'

/** One's own, while one may still do what it was asked for with. */
async function ownExport(tx: Transaction, person: Person, id: string) {
  const row = await exportById(tx, id)
  if (row?.userId !== person.id) throw notFound('export')
  authorise(person, exportRight[wantedSchema.parse(row.wanted).kind], row, 'export')
  return row
}

export const readExport = (person: Person, id: string): Promise<ExportAnswer> =>
  read(async (tx) => exportAnswer(await ownExport(tx, person, id)))

export async function exportedFile(person: Person, id: string): Promise<MadeFile> {
  return read(async (tx) => {
    const { media, fileName } = await ownExport(tx, person, id)
    const file = await fileOfExport(tx, id)
    if (!file || !media || !fileName) throw notFound('file')
    return { file, media, fileName }
  })
}
