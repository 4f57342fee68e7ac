'use client'

import { degrees } from '@/components/drawing/clock-moves'
import { flagClass, flagForm, kindNames, titleOf } from './note-words'
import type { NoteDesk } from './use-note-desk'

/** The notes at their crank angles, over the rule. */
export function NoteFlags({ desk }: { desk: NoteDesk }) {
  const { list, drawing, openNumber, openNote } = desk
  const cycleDeg = degrees(drawing.clock.cycle)
  return (
    <div className="note-flags">
      {list.notes.map((note) => (
        <button
          key={note.number}
          type="button"
          tabIndex={-1}
          className={note.number === openNumber ? 'rule-flag on' : 'rule-flag'}
          style={{ left: `calc(26px + (100% - 52px) * ${note.anchor.angleDeg / cycleDeg})` }}
          aria-label={`Note ${note.number} at ${note.anchor.angleDeg.toFixed(1)}°, ${kindNames[note.kind].toLowerCase()}: ${titleOf(note)}`}
          onClick={() => openNote(note.number)}
        >
          <span className={flagClass[flagForm(note)]}>{note.number}</span>
        </button>
      ))}
    </div>
  )
}
