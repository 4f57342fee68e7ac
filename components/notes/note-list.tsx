'use client'

import { useEffect, useRef, useState } from 'react'
import { Segmented } from '@/components/ui/segmented'
import { noteKinds, type Note, type NoteKind, type NoteState, type NoteSummary } from '@/lib/contracts/notes'
import { NoteForm } from './note-form'
import { flagClass, flagForm, kindNames, standingWords, titleOf } from './note-words'
import { OpenNote } from './open-note'
import { PartChooser } from './part-chooser'
import { Refused } from './refused'
import { refusalWords } from './refusal-words'
import { noteKeys } from './note-keys'
import { everyNote } from './use-notes'
import type { NoteDesk } from './use-note-desk'

/** The notes of a version as text, the open one with its thread in its place. */
export function NoteList({ desk }: { desk: NoteDesk }) {
  const { list, choice, choose, open, openNumber, openError, mode } = desk
  const { counts, notes } = list
  const host = useRef<HTMLDivElement>(null)
  const opened = useRef(openNumber)

  // whoever opens a note from the drawing finds it in the list
  useEffect(() => {
    if (!open || opened.current === open.number) return
    opened.current = open.number
    const article = host.current?.querySelector<HTMLElement>(`#note-${open.number}`)
    article?.focus({ preventScroll: true })
    article?.scrollIntoView({ block: 'nearest' })
  }, [open])

  // the open note keeps its place also when it has come to match no longer: somebody may be writing in it
  const rows: NoteSummary[] =
    open && !notes.some(({ number }) => number === open.number)
      ? [...notes, open].sort((a, b) => a.number - b.number)
      : notes
  return (
    <div className="note-list" ref={host} onKeyDown={noteKeys(desk)}>
      <div className="listhead">
        <h2>Notes</h2>
        <Segmented
          label="Notes shown"
          value={choice.state}
          options={states.map((value) => ({ value, label: labelOf(value, counts) }))}
          onChange={(state) => choose({ ...choice, state })}
        />
      </div>
      <Filters desk={desk} />
      {mode.at === 'placing' ? <Placing desk={desk} move={mode.move} /> : null}
      {mode.at === 'writing' ? <NoteForm desk={desk} mode={mode} /> : null}
      {list.error ? <p className="state">{refusalWords(list.error)}</p> : null}
      {openError ? <p className="state">{refusalWords(openError)}</p> : null}
      {notes.length === 0 && !list.loading && !list.error ? <Empty desk={desk} /> : null}
      <ul className="nlist">
        {rows.map((note) => (
          <li key={note.number} className={note.number === openNumber ? 'is-open' : undefined}>
            {open && open.number === note.number ? (
              <OpenNote key={open.number} desk={desk} note={open} />
            ) : (
              <Row note={note} desk={desk} />
            )}
          </li>
        ))}
      </ul>
      {list.more ? (
        <button type="button" className="btn sm more-notes" onClick={() => void list.more?.()}>
          More notes
        </button>
      ) : null}
      {notes.length > 0 ? (
        <p className="cap keys-said">In the list or the drawing: N next note, P note before, V go to view.</p>
      ) : null}
    </div>
  )
}

/** Only what is shown can be pinned: a note on a hidden part would stand nowhere. */
function Placing({ desk, move }: { desk: NoteDesk; move: Note | null }) {
  const { drawing, pinAt, light, setMode } = desk
  const { model, shown } = drawing
  const choices = [
    ...model.rig.parts.filter(({ group }) => !shown.hidden.includes(group)),
    ...(shown.overlays.shaking ? [{ id: 'vector:total-force', label: 'Shaking force' }] : []),
  ]
  return (
    <>
      <PartChooser
        what={move ? `Pin note ${move.number} again` : 'Pin a note'}
        choices={choices}
        from={desk.open?.anchor.partId}
        onPart={(id) => void pinAt(id, null)}
        onLight={light}
        onClose={() => setMode({ at: 'reading' })}
      />
      <Refused text={desk.placeRefused} />
    </>
  )
}

const states = ['open', 'settled', 'all'] as const

const labelOf = (state: NoteState | 'all', counts: { open: number; settled: number; all: number } | null) =>
  `${{ open: 'Open', settled: 'Settled', all: 'All' }[state]}${counts ? ` ${counts[state]}` : ''}`

function Row({ note, desk }: { note: NoteSummary; desk: NoteDesk }) {
  const asides = [
    standingWords[note.standing],
    note.state === 'settled'
      ? note.settled?.settlement.reason === 'fixed'
        ? `settled in ${note.settled.settlement.version}`
        : 'settled'
      : kindNames[note.kind].toLowerCase(),
    note.by.guest ? 'guest' : '',
    note.replies > 0 ? `${note.replies} ${note.replies === 1 ? 'reply' : 'replies'}` : '',
  ].filter(Boolean)
  return (
    <button
      type="button"
      className="note-row"
      onClick={() => desk.openNote(note.number)}
      onPointerEnter={() => desk.light(note.anchor.partId)}
      onPointerLeave={() => desk.light(null)}
    >
      <span className={flagClass[flagForm(note)]}>{note.number}</span>
      <span>{titleOf(note)}</span>
      <span className="cap">{asides.join(', ')}</span>
    </button>
  )
}

/** By kind, author, part and version; behind one word until they are wanted. */
function Filters({ desk }: { desk: NoteDesk }) {
  const { choice, choose, list, version, drawing } = desk
  const [shown, setShown] = useState(false)
  const chosen = [choice.kind, choice.author, choice.part, choice.madeOn].filter(
    (value) => value !== '',
  ).length
  const parts = [...new Set([...list.notes.map(({ anchor }) => anchor.partId), choice.part])].filter(Boolean)
  const labelOfPart = (id: string) => drawing.model.rig.parts.find((part) => part.id === id)?.label ?? id
  return (
    <div className="note-filters">
      <button type="button" className="btn sm txt" aria-expanded={shown} onClick={() => setShown(!shown)}>
        {chosen > 0 ? `Chosen by ${chosen}` : 'Choose by kind, author, part, version'}
      </button>
      {chosen > 0 ? (
        <button
          type="button"
          className="btn sm txt"
          onClick={() => choose({ ...everyNote, state: choice.state })}
        >
          Choose anew
        </button>
      ) : null}
      {shown ? (
        <div className="filter-grid">
          <Choice
            label="Kind"
            value={choice.kind}
            options={noteKinds.map((kind) => [kind, `${kindNames[kind]}${countOf(list.counts, kind)}`])}
            onChange={(kind) => choose({ ...choice, kind: noteKinds.find((each) => each === kind) ?? '' })}
          />
          <Choice
            label="Author"
            value={choice.author}
            options={list.authors.map(({ id, name }) => [id, name])}
            onChange={(author) => choose({ ...choice, author })}
          />
          <Choice
            label="Part"
            value={choice.part}
            options={parts.map((id) => [id, labelOfPart(id)])}
            onChange={(part) => choose({ ...choice, part })}
          />
          <Choice
            label="Made on version"
            value={String(choice.madeOn)}
            options={Array.from({ length: version }, (_, i) => [String(version - i), String(version - i)])}
            onChange={(made) => choose({ ...choice, madeOn: made === '' ? '' : Number(made) })}
          />
        </div>
      ) : null}
    </div>
  )
}

const countOf = (counts: { kinds: Partial<Record<NoteKind, number>> } | null, kind: NoteKind) =>
  counts ? ` ${counts.kinds[kind] ?? 0}` : ''

interface ChoiceProps {
  label: string
  value: string
  options: [value: string, label: string][]
  onChange(value: string): void
}

const Choice = ({ label, value, options, onChange }: ChoiceProps) => (
  <label className="lf">
    <span className="lab">{label}</span>
    <span className="box">
      <select value={value} onChange={(event) => onChange(event.target.value)}>
        <option value="">any</option>
        {options.map(([each, words]) => (
          <option key={each} value={each}>
            {words}
          </option>
        ))}
      </select>
    </span>
  </label>
)

function Empty({ desk }: { desk: NoteDesk }) {
  const { choice, may } = desk
  if (choice.state === 'open' && desk.list.counts && desk.list.counts.all > 0)
    return <p className="state">No note is open.</p>
  return (
    <p className="state">
      {may.includes('note.write')
        ? 'No notes yet. “Pin a note”, then click a part of the drawing.'
        : 'No notes yet.'}
    </p>
  )
}
