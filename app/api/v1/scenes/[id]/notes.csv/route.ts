import { notesAsCsv as contract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { exportedNotes } from '@/lib/services/notes/exported-notes'
import { notesCsv } from '@/lib/services/notes/notes-csv'
import { fileResponse } from '../../../file-response'

export const GET = handle(contract, async ({ person, params, query }) => {
  const csv = notesCsv(await exportedNotes(person, params.id, query))
  return fileResponse(new TextEncoder().encode(csv), 'text/csv; charset=utf-8', 'notes.csv')
})
