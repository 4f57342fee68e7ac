'use client'

import { Fragment } from 'react'
import { standingWords } from './note-words'
import { everyNote, useNoteList } from './use-notes'
import type { NoteDesk } from './use-note-desk'

/** What a version has done to the notes: which are new in it, whose part has changed or gone, and how many are as before. */
export function TouchedNotes({ desk }: { desk: NoteDesk }) {
  const { notes } = useNoteList(desk.sceneId, desk.version, everyNote)
  if (notes.length === 0) return null
  const told = notes.flatMap(({ number, version, state, standing }) => {
    const words = [
      state === 'settled' && standing !== 'same' ? 'settled' : '',
      version === desk.version ? `new in ${version}` : standingWords[standing],
    ].filter(Boolean)
    return words.length > 0 ? [{ number, words: words.join(', ') }] : []
  })
  const rest = notes.length - told.length
  return (
    <div className="after touched">
      <h3>Notes touched by this</h3>
      <p className="cap">
        {told.map(({ number, words }) => (
          <Fragment key={number}>
            <button type="button" className="btn sm txt" onClick={() => desk.openNote(number)}>
              {number}
            </button>{' '}
            {words}{' '}
          </Fragment>
        ))}
        {rest > 0 ? `${rest} as before` : ''}
      </p>
    </div>
  )
}
