import type { KeyboardEvent } from 'react'
import type { NoteDesk } from './use-note-desk'

/** Keys that go from note to note while the list or the drawing has the focus; whoever types is left alone. */
export const noteKeys = (desk: NoteDesk) => (event: KeyboardEvent) => {
  if (event.ctrlKey || event.altKey || event.metaKey) return
  const target = event.target as HTMLElement
  if (target.closest('input, textarea, select, dialog, [role="spinbutton"], .still')) return
  const key = event.key.toLowerCase()
  if (key === 'n') desk.step(1)
  else if (key === 'p') desk.step(-1)
  else if (key === 'v' && desk.open) desk.goTo(desk.open)
  else return
  event.preventDefault()
}
