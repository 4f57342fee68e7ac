'use client'

import { useState } from 'react'
import type { Note, NotePost } from '@/lib/contracts/notes'
import { mentionedIn } from './mentions'
import { timeWords } from './note-words'
import { Refused } from './refused'
import { useColleagues } from './use-colleagues'
import type { NoteDesk } from './use-note-desk'
import { useSending } from './use-sending'
import { WordsField } from './words-field'

interface Props {
  desk: NoteDesk
  note: Note
  post: NotePost
}

/** One post of a thread: what it says, what is drawn with it, and what its author may still do. */
export function Post({ desk, note, post }: Props) {
  const [editing, setEditing] = useState(false)
  const { busy, refused, send } = useSending()
  const { by, deletedAt, editedAt, drawing } = post
  const editable = post.own && post.editableUntil !== null
  return (
    <div className="post">
      <p className="who">
        <b>{by.name}</b>
        {by.guest ? <span className="guest-mark">guest</span> : null}
        <span className="grow" />
        <time className="cap" dateTime={post.at}>
          {timeWords(post.at)}
          {editedAt && !deletedAt ? ', edited' : ''}
        </time>
      </p>
      {deletedAt ? (
        <p className="cap">Taken back {timeWords(deletedAt)}.</p>
      ) : editing ? (
        <EditPost desk={desk} note={note} post={post} onDone={() => setEditing(false)} />
      ) : (
        <p className="said">{post.words}</p>
      )}
      {drawing && !deletedAt ? (
        <p className="cap drawn">
          Drawn on the picture: {drawing.words}{' '}
          <button type="button" className="btn sm txt" onClick={() => desk.goTo(note)}>
            Show it
          </button>
        </p>
      ) : null}
      {!editing && !deletedAt && (editable || post.mayDelete) ? (
        <p className="post-acts">
          {editable ? (
            <button type="button" className="btn sm txt" onClick={() => setEditing(true)}>
              Edit until {timeWords(post.editableUntil ?? post.at).split(', ')[1]}
            </button>
          ) : null}
          {post.mayDelete ? (
            <button
              type="button"
              className="btn sm txt"
              disabled={busy}
              onClick={() => void send(() => desk.actions.remove(note.number, post.post))}
            >
              Take back
            </button>
          ) : null}
        </p>
      ) : null}
      <Refused text={refused} />
    </div>
  )
}

function EditPost({ desk, note, post, onDone }: Props & { onDone(): void }) {
  const [words, setWords] = useState(post.words)
  const people = useColleagues(desk.workshopId)
  const { busy, refused, refuse, send } = useSending()
  const save = () => {
    if (!words.trim()) return refuse('A post says something: take it back instead.')
    const mentions = mentionedIn(words, people)
    void send(
      () => desk.actions.edit(note.number, post.post, { revision: post.revision, words, mentions }),
      onDone,
    )
  }
  return (
    <form
      aria-label="Edit the post"
      onSubmit={(event) => {
        event.preventDefault()
        save()
      }}
    >
      <WordsField
        label="What it says"
        value={words}
        onChange={setWords}
        people={people}
        rows={3}
        maxLength={4000}
      />
      <Refused text={refused} />
      <div className="row acts2">
        <button type="button" className="btn sm" onClick={onDone}>
          Leave it
        </button>
        <span className="grow" />
        <button type="submit" className="btn sm pri" disabled={busy}>
          Keep change
        </button>
      </div>
    </form>
  )
}
