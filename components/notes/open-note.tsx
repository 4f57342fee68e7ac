'use client'

import { useId, useState, type ReactNode } from 'react'
import { settlementInWords } from '@/lib/contracts/note-words'
import type { Note, NoteEvent, NoteKind } from '@/lib/contracts/notes'
import { mentionedIn } from './mentions'
import { flagClass, flagForm, kindNames, timeWords, viewNames } from './note-words'
import { Post } from './post'
import { Refused } from './refused'
import { SettleDialog } from './settle-dialog'
import { SketchTools } from './sketch-tools'
import { stillDrawingOf } from './sketch'
import { useColleagues } from './use-colleagues'
import type { NoteDesk } from './use-note-desk'
import { useSending } from './use-sending'
import { WordsField } from './words-field'

/** The open note: where it is pinned, its thread, and what may be done with it. */
export function OpenNote({ desk, note }: { desk: NoteDesk; note: Note }) {
  const { may, actions, setMode } = desk
  const [settling, setSettling] = useState(false)
  const { busy, refused, send } = useSending()
  const { anchor } = note
  const mayWrite = may.includes('note.write')
  const events = note.events.filter(({ what }) => what.event !== 'settled' || note.state === 'open')
  return (
    <article className="nopen" id={`note-${note.number}`} aria-label={`Note ${note.number}`} tabIndex={-1}>
      <header>
        <span className={flagClass[flagForm(note)]}>{note.number}</span>
        <div>
          <h3>{note.heading || note.part}</h3>
          <p className="cap">
            {note.mayChangeKind ? (
              <KindChoice
                kind={note.kind}
                onKind={(kind) =>
                  void send(() => actions.change(note.number, { revision: note.revision, kind }))
                }
              />
            ) : (
              kindNames[note.kind]
            )}
            {' · '}at {anchor.angleDeg.toFixed(1)}°{anchor.view ? `, ${viewNames[anchor.view]}` : ''} ·
            version {note.version} · {note.part}
          </p>
        </div>
      </header>
      {note.standing === 'same' ? null : (
        <Standing
          note={note}
          version={desk.version}
          onMove={
            mayWrite && note.state === 'open' ? () => setMode({ at: 'placing', move: note }) : undefined
          }
        />
      )}
      {note.posts.map((post) => (
        <Post key={post.post} desk={desk} note={note} post={post} />
      ))}
      {events.map((event, i) => (
        <p key={i} className="cap event">
          {event.by} {eventWords(event)}, {timeWords(event.at)}
        </p>
      ))}
      {note.settled ? (
        <p className="settled">
          <b>Settled: {settlementInWords(note.settled.settlement)}.</b> {note.settled.by},{' '}
          {timeWords(note.settled.at)}
          {note.settled.words ? `: ${note.settled.words}` : ''}
        </p>
      ) : null}
      <Refused text={refused} />
      {mayWrite ? (
        <Reply desk={desk} note={note}>
          <button type="button" className="btn sm" onClick={() => desk.goTo(note)}>
            Go to view
          </button>
          <span className="grow" />
          {note.state === 'open' && note.maySettle ? (
            <button type="button" className="btn sm" onClick={() => setSettling(true)}>
              Settle…
            </button>
          ) : null}
          {note.state === 'settled' && note.maySettle ? (
            <button
              type="button"
              className="btn sm"
              disabled={busy}
              onClick={() => void send(() => actions.reopen(note.number, {}))}
            >
              Open again
            </button>
          ) : null}
        </Reply>
      ) : (
        <div className="row acts2">
          <button type="button" className="btn sm" onClick={() => desk.goTo(note)}>
            Go to view
          </button>
        </div>
      )}
      {settling ? <SettleDialog desk={desk} note={note} onClose={() => setSettling(false)} /> : null}
    </article>
  )
}

function KindChoice({ kind, onKind }: { kind: NoteKind; onKind(kind: NoteKind): void }) {
  return (
    <select
      className="kind-choice"
      aria-label="Kind"
      value={kind}
      onChange={(event) => onKind(event.target.value as NoteKind)}
    >
      {Object.entries(kindNames).map(([value, label]) => (
        <option key={value} value={value}>
          {label}
        </option>
      ))}
    </select>
  )
}

/** What has become of the pinned part since, and the way to pin the note again. */
function Standing({ note, version, onMove }: { note: Note; version: number; onMove?(): void }) {
  const gone = note.standing === 'gone'
  const changes = note.changes.map(({ name, from, to, unit }) => `${name} ${from} → ${to} ${unit}`.trim())
  return (
    <p className="stands">
      <b>{gone ? 'Part gone' : 'Part changed'}</b>{' '}
      {gone
        ? `in version ${version}: ${note.part} is no longer there.`
        : `since version ${note.anchor.version}: ${changes.join(', ')}. Look again.`}{' '}
      {onMove ? (
        <button type="button" className="btn sm txt" onClick={onMove}>
          Pin again
        </button>
      ) : null}
    </p>
  )
}

function eventWords({ what }: NoteEvent): string {
  if (what.event === 'settled') return `settled it: ${settlementInWords(what.settlement)}`
  if (what.event === 'reopened') return what.words ? `opened it again: ${what.words}` : 'opened it again'
  if (what.event === 'moved') return `pinned it again, in version ${what.to.version}`
  return `made it ${kindNames[what.to].toLowerCase()}, was ${kindNames[what.from].toLowerCase()}`
}

function Reply({ desk, note, children }: { desk: NoteDesk; note: Note; children: ReactNode }) {
  const { actions, sketch, setSketch, workshopId } = desk
  const id = useId()
  const [words, setWords] = useState('')
  const people = useColleagues(workshopId)
  const { busy, refused, refuse, send } = useSending()
  const reply = () => {
    if (!words.trim()) return refuse('Say something first: a reply has words.')
    const drawing = sketch && stillDrawingOf(sketch)
    if (drawing && !drawing.words)
      return refuse('Say in words what the drawing shows: not everybody sees it.')
    const mentions = mentionedIn(words, people)
    void send(
      (key) => actions.reply(note.number, { words, mentions, drawing }, key),
      () => {
        setWords('')
        setSketch(null)
      },
    )
  }
  return (
    <form
      className="reply"
      aria-label="Reply"
      onSubmit={(event) => {
        event.preventDefault()
        reply()
      }}
    >
      <WordsField
        label="Your reply"
        value={words}
        onChange={setWords}
        people={people}
        maxLength={4000}
        describedBy={refused ? `${id}-refused` : undefined}
        refused={refused !== null && !words.trim()}
      />
      {words || sketch ? <SketchTools desk={desk} at={note} /> : null}
      <Refused id={`${id}-refused`} text={refused} />
      <div className="row acts2">
        {children}
        <button type="submit" className="btn sm pri" disabled={busy}>
          Reply
        </button>
      </div>
    </form>
  )
}
