'use client'

import { useEffect, useId, useRef, useState } from 'react'
import { Segmented } from '@/components/ui/segmented'
import type { NoteKind } from '@/lib/contracts/notes'
import { mentionedIn } from './mentions'
import { kindNames, viewNames } from './note-words'
import { Refused } from './refused'
import { SketchTools } from './sketch-tools'
import { stillDrawingOf } from './sketch'
import { useColleagues } from './use-colleagues'
import type { DeskMode, NoteDesk } from './use-note-desk'
import { useSending } from './use-sending'
import { WordsField } from './words-field'

const kinds = Object.entries(kindNames).map(([value, label]) => ({ value: value as NoteKind, label }))

/** What a new pin says: kind, heading, words, and what is drawn on the still picture. */
export function NoteForm({ desk, mode }: { desk: NoteDesk; mode: DeskMode & { at: 'writing' } }) {
  const { actions, sketch, setSketch, setMode, openNote, workshopId } = desk
  const { anchor, part } = mode
  const id = useId()
  const form = useRef<HTMLFormElement>(null)
  const [kind, setKind] = useState<NoteKind>('remark')
  const [heading, setHeading] = useState('')
  const [words, setWords] = useState('')
  const people = useColleagues(workshopId)
  const { busy, refused, refuse, send } = useSending()

  useEffect(() => form.current?.querySelector<HTMLElement>('[aria-checked="true"]')?.focus(), [])

  const pin = () => {
    if (!words.trim()) return refuse('Say in words what it is about.')
    const drawing = sketch && stillDrawingOf(sketch)
    if (drawing && !drawing.words)
      return refuse('Say in words what the drawing shows: not everybody sees it.')
    void send(async (key) => {
      const mentions = mentionedIn(words, people)
      const note = await actions.make({ anchor, kind, heading, words, mentions, drawing }, key)
      setSketch(null)
      openNote(note.number)
    })
  }
  return (
    <form
      ref={form}
      className="nopen note-form"
      aria-label="New note"
      onSubmit={(event) => {
        event.preventDefault()
        pin()
      }}
    >
      <header>
        <div>
          <h3>Note on {part}</h3>
          <p className="cap">
            at {anchor.angleDeg.toFixed(1)}°{anchor.view ? `, ${viewNames[anchor.view]}` : ''}, version{' '}
            {anchor.version}
          </p>
        </div>
      </header>
      <Segmented label="Kind" value={kind} options={kinds} onChange={setKind} className="kinds" />
      <div className="lf">
        <label htmlFor={`${id}-heading`}>Heading, if it needs one</label>
        <div className="box">
          <input
            id={`${id}-heading`}
            value={heading}
            maxLength={120}
            onChange={(event) => setHeading(event.target.value)}
          />
        </div>
      </div>
      <WordsField
        label="What is it about? @ names a colleague"
        value={words}
        onChange={setWords}
        people={people}
        rows={3}
        maxLength={4000}
        refused={refused !== null && !words.trim()}
        describedBy={refused ? `${id}-refused` : undefined}
      />
      <SketchTools desk={desk} at={{ anchor }} />
      <Refused id={`${id}-refused`} text={refused} />
      <div className="row acts2">
        <button
          type="button"
          className="btn sm"
          onClick={() => {
            setSketch(null)
            setMode({ at: 'reading' })
          }}
        >
          Leave it
        </button>
        <span className="grow" />
        <button type="submit" className="btn sm pri" disabled={busy}>
          Pin note
        </button>
      </div>
    </form>
  )
}
