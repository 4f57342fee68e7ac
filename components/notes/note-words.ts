import type { NoteKind, NoteState } from '@/lib/contracts/notes'
import type { Standing } from '@/scene/model/anchor'
import type { NamedView } from '@/scene/frame/named-views'
import type { Pin } from '@/scene/stage/pins'

export const kindNames: Record<NoteKind, string> = {
  error: 'Error',
  question: 'Question',
  suggestion: 'Suggestion',
  remark: 'Remark',
}

export const viewNames: Record<NamedView, string> = {
  free: 'free view',
  end: 'end view',
  drive: 'drive end view',
  side: 'side view',
  bank: 'bank view',
  top: 'top view',
}

/** What has become of the pinned part; nothing where it is as it was. */
export const standingWords: Record<Standing, string> = {
  same: '',
  changed: 'part changed',
  gone: 'part gone',
}

/** A flag is filled for an error or whatever is open, washed for a question, an outline once settled. */
export const flagForm = ({ kind, state }: { kind: NoteKind; state: NoteState }): Pin['form'] =>
  state === 'settled' ? 'outline' : kind === 'question' ? 'washed' : 'filled'

/** The same as a class of the sheet's own flags. */
export const flagClass = { filled: 'fl', washed: 'fl q', outline: 'fl done' } as const

const time = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  hour: '2-digit',
  minute: '2-digit',
})

/** "14 Nov, 09:12", in the reader's zone. */
export const timeWords = (at: string) => time.format(new Date(at))

/** What a note is called in a list: its heading, or how it begins. */
export function titleOf({ heading, words }: { heading: string; words: string }): string {
  if (heading) return heading
  if (!words) return 'Words taken back'
  return words.length > 90 ? `${words.slice(0, 88).trimEnd()}…` : words
}
