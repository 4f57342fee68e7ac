'use client'

import { useId, useState } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { Segmented } from '@/components/ui/segmented'
import { sendTo } from '@/lib/contracts/call'
import type { GuestNote } from '@/lib/contracts/guest-notes'
import type { Anchor } from '@/scene/model/anchor'
import { kindNames, timeWords } from './note-words'
import { Refused } from './refused'
import { useSending } from './use-sending'

type Address = (path: string) => string

const nameKey = 'counterthrow.guest'
function keptName(): string {
  try {
    return sessionStorage.getItem(nameKey) ?? ''
  } catch {
    return ''
  }
}
function keepName(name: string) {
  try {
    sessionStorage.setItem(nameKey, name)
  } catch {
    // Storage may be closed to us: the name is then typed again.
  }
}

function NameField({ value, onChange }: { value: string; onChange(value: string): void }) {
  const id = useId()
  return (
    <div className="lf">
      <label htmlFor={id}>Your name, shown with the note</label>
      <div className="box">
        <input
          id={id}
          value={value}
          maxLength={80}
          autoComplete="name"
          onChange={(event) => onChange(event.target.value)}
        />
      </div>
    </div>
  )
}

function Words({ label, value, onChange }: { label: string; value: string; onChange(value: string): void }) {
  const id = useId()
  return (
    <div className="lf">
      <label htmlFor={id}>{label}</label>
      <div className="box">
        <textarea
          id={id}
          rows={3}
          maxLength={4000}
          value={value}
          onChange={(event) => onChange(event.target.value)}
        />
      </div>
    </div>
  )
}

const kinds = (['remark', 'question', 'suggestion'] as const).map((value) => ({
  value,
  label: kindNames[value],
}))

interface NewProps {
  address: Address
  anchor: Anchor
  part: string
  onClose(): void
  onMade(): void
}

/** A guest's note: a name, a kind, words, pinned where they pointed. */
export function GuestNoteDialog({ address, anchor, part, onClose, onMade }: NewProps) {
  const [name, setName] = useState(keptName)
  const [kind, setKind] = useState<(typeof kinds)[number]['value']>('remark')
  const [words, setWords] = useState('')
  const { busy, refused, refuse, send } = useSending()
  const leave = () => {
    if (!name.trim()) return refuse('Give a name: it stands with the note, marked guest.')
    if (!words.trim()) return refuse('Say in words what it is about.')
    keepName(name.trim())
    void send(() => sendTo('POST', address('/notes'), { body: { name, anchor, kind, words } }), onMade)
  }
  return (
    <Dialog
      title="Leave a note"
      about={{ k: 'Pinned to', v: `${part}, at ${anchor.angleDeg.toFixed(1)}°` }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Leave it
          </button>
          <button type="button" className="btn pri" disabled={busy} onClick={leave}>
            Pin note
          </button>
        </>
      }
    >
      <NameField value={name} onChange={setName} />
      <Segmented label="Kind" value={kind} options={kinds} onChange={setKind} />
      <Words label="What is it about?" value={words} onChange={setWords} />
      <Refused text={refused} />
    </Dialog>
  )
}

interface ThreadProps {
  address: Address
  note: GuestNote
  onClose(): void
  onReplied(): void
}

/** A note that was made through this link, with the replies to it. */
export function GuestThread({ address, note, onClose, onReplied }: ThreadProps) {
  const [name, setName] = useState(keptName)
  const [words, setWords] = useState('')
  const { busy, refused, refuse, send } = useSending()
  const reply = () => {
    if (!name.trim()) return refuse('Give a name: it stands with the reply, marked guest.')
    if (!words.trim()) return refuse('Say something first: a reply has words.')
    keepName(name.trim())
    void send(
      () => sendTo('POST', address(`/notes/${note.number}/posts`), { body: { name, words } }),
      () => {
        setWords('')
        onReplied()
      },
    )
  }
  return (
    <Dialog
      title={`Note ${note.number}, ${note.state}`}
      about={{ k: 'Pinned to', v: `${note.part}, at ${note.anchor.angleDeg.toFixed(1)}°` }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Close
          </button>
          <button type="button" className="btn pri" disabled={busy} onClick={reply}>
            Reply
          </button>
        </>
      }
    >
      {note.posts.map((each) => (
        <div className="post" key={each.post}>
          <p className="who">
            <b>{each.by}</b>
            {each.guest ? <span className="guest-mark">guest</span> : null}
            <span className="grow" />
            <time className="cap" dateTime={each.at}>
              {timeWords(each.at)}
            </time>
          </p>
          <p className="said">{each.deleted ? 'Taken back.' : each.words}</p>
        </div>
      ))}
      <NameField value={name} onChange={setName} />
      <Words label="Your reply" value={words} onChange={setWords} />
      <Refused text={refused} />
    </Dialog>
  )
}
