import { notesAsJson as contract } from '@/lib/contracts/notes'
import { handle } from '@/lib/http/handle'
import { exportedNotes } from '@/lib/services/notes/exported-notes'

export const GET = handle(contract, ({ person, params, query }) => exportedNotes(person, params.id, query))
