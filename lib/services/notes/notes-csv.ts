import { settlementInWords, standingInWords } from '@/lib/contracts/note-words'
import type { Note, NotePost, Writer } from '@/lib/contracts/notes'
import { tableCsv } from '@/lib/tables/csv'
import type { Cell, Column } from '@/lib/tables/table'
import type { ExportedNotes } from './exported-notes'

const plain = (name: string): Column => ({ name, unit: '' })

const columns: { column: Column; cell: (note: Note) => Cell }[] = [
  { column: plain('Note'), cell: ({ number }) => number },
  { column: plain('Kind'), cell: ({ kind }) => kind },
  { column: plain('State'), cell: ({ state }) => state },
  { column: plain('Settled'), cell: ({ settled }) => settled && settlementInWords(settled.settlement) },
  { column: plain('Settled by'), cell: ({ settled }) => settled && settled.by },
  { column: plain('Heading'), cell: ({ heading }) => heading },
  { column: plain('Words'), cell: ({ posts }) => said(posts[0]) },
  { column: plain('Drawn'), cell: ({ posts }) => posts[0].drawing?.words ?? null },
  { column: plain('By'), cell: ({ by }) => writerInWords(by) },
  { column: plain('Written'), cell: ({ at }) => at },
  { column: plain('Part'), cell: ({ part }) => part },
  { column: plain('Part name in the document'), cell: ({ anchor }) => anchor.partId },
  { column: { name: 'Crank angle', unit: '°' }, cell: ({ anchor }) => anchor.angleDeg },
  { column: plain('Made on version'), cell: ({ version }) => version },
  { column: plain('Pinned in version'), cell: ({ anchor }) => anchor.version },
  { column: plain('Look again'), cell: (note) => standingInWords(note) || null },
  { column: plain('Replies'), cell: ({ posts }) => thread(posts.slice(1)) || null },
]

export const writerInWords = ({ name, guest }: Writer) => (guest ? `${name} (guest)` : name)

const said = ({ words, deletedAt }: NotePost) => (deletedAt ? '(deleted)' : words)

const thread = (posts: readonly NotePost[]) =>
  posts.map((post) => `${writerInWords(post.by)}, ${post.at}: ${said(post)}`).join('\n')

/** A row a note, its thread in one cell; what a spreadsheet would take for a formula is neutralised. */
export const notesCsv = ({ scene, version, notes }: ExportedNotes): string =>
  tableCsv(
    {
      title: 'Notes',
      columns: columns.map(({ column }) => column),
      rows: notes.map((note) => columns.map(({ cell }) => cell(note))),
    },
    { scene, version: String(version), notes: String(notes.length) },
  )
