'use client'

import Link from 'next/link'
import { useId, useRef, useState, type ReactNode } from 'react'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { useBench, useSessionState } from '@/scene/session/react'
import { sameTrain } from '@/scene/session/same-train'
import type { BenchPerson } from './person'
import { UnitsSwitch } from './units-switch'

interface Props {
  person: BenchPerson | null
  /** What draws, and in a sentence why. */
  drawn: { words: string; reason: string }
  keptAt: string | null
  /** The latest version of the scene; 0 where nothing is saved. */
  head: number
  busy: boolean
  /** How the saved version stands with those who judge it. */
  standing: ReactNode
  onSave(): void
  onShare(): void
}

/** What this sheet is, and its main actions. */
export function BenchTitle({ person, drawn, keptAt, head, busy, standing, onSave, onShare }: Props) {
  const { session } = useBench()
  const title = useSessionState((state) => state.scene.train.title)
  const saved = useSessionState((state) => state.saved)
  const changed = useSessionState(
    ({ saved: of, scene }) => of !== null && !sameTrain(of.scene.train, scene.train),
  )
  const refused = useSessionState((state) => Object.keys(state.refused).length)
  const next = head + 1
  const mayWrite = !person || person.may.includes(saved ? 'scene.save' : 'scene.create')
  return (
    <TitleBlock>
      <div className="c6 top first">
        <span className="k">Title</span>
        <TitleField
          title={title}
          onTitle={(text) => session.edit([{ path: ['train', 'title'], value: text }], 'title')}
          onDone={session.seal}
        />
      </div>
      <TitleCell k="Version" span={2} first>
        <span className="v">
          {saved ? (
            <Link href={`/scenes/${saved.sceneId}/versions`} prefetch={false} title="All versions">
              {saved.version}
              {changed ? ', with changes' : ''}
            </Link>
          ) : (
            'not saved yet'
          )}
        </span>
      </TitleCell>
      <TitleCell k="Drawn" span={2}>
        <span className="v" title={drawn.reason}>
          {drawn.words}
        </span>
      </TitleCell>
      <TitleCell k="Units" span={2}>
        <UnitsSwitch />
      </TitleCell>
      <TitleCell k="Workshop" span={3} first>
        <span className="v">{person?.workshop ?? 'none, signed out'}</span>
      </TitleCell>
      <TitleCell k="Drawn by" span={3}>
        <span className="v">{person?.name ?? 'you'}</span>
      </TitleCell>
      {standing}
      <TitleActions
        note={
          refused > 0
            ? `${refused} value${refused > 1 ? 's' : ''} not taken`
            : saved && saved.version < head
              ? `Version ${saved.version} of ${head} is open: saving makes version ${next}`
              : keptAt
                ? `Draft kept ${keptAt}`
                : 'Draft not kept yet'
        }
      >
        {!person || person.may.includes('link.create') ? (
          <button type="button" className="btn" disabled={busy} onClick={onShare}>
            Share…
          </button>
        ) : null}
        <button
          type="button"
          className="btn pri"
          disabled={busy || !mayWrite}
          title={mayWrite ? undefined : 'held: your role reads scenes'}
          onClick={onSave}
        >
          Save version {next}
        </button>
      </TitleActions>
    </TitleBlock>
  )
}

/** The title is text until it is pressed; then it can be written over. */
function TitleField({
  title,
  onTitle,
  onDone,
}: {
  title: string
  onTitle(text: string): void
  onDone(): void
}) {
  const id = useId()
  const field = useRef<HTMLInputElement>(null)
  const [typed, setTyped] = useState<string | null>(null)
  return (
    <h1 className="v title">
      <label className="vh" htmlFor={id}>
        Title of the sheet
      </label>
      <input
        ref={field}
        id={id}
        className="title-field"
        maxLength={200}
        value={typed ?? title}
        onChange={(event) => {
          setTyped(event.target.value)
          if (event.target.value.trim()) onTitle(event.target.value)
        }}
        onBlur={() => {
          setTyped(null)
          onDone()
        }}
        onKeyDown={(event) => {
          if (event.key === 'Enter') field.current?.blur()
        }}
      />
    </h1>
  )
}
