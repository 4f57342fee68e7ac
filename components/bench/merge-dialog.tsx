'use client'

import { useId, useMemo, useState } from 'react'
import { ChangeTable } from '@/components/figures/change-table'
import { Dialog } from '@/components/ui/dialog'
import type { SaveConflict } from '@/lib/contracts/scenes'
import type { System } from '@/lib/units/quantities'
import { compareScenes, seenChanges } from '@/scene/model/compare-scenes'
import { mergeScenes, type Choices } from '@/scene/model/merge-scenes'
import type { Scene } from '@/scene/model/scene'
import { useSessionState } from '@/scene/session/react'
import { MergeChoices } from './merge-choices'
import { rowNumber } from './row-number'
import type { Instead } from './use-saving'

type Way = 'together' | 'mine' | 'own' | 'theirs'

interface Props {
  conflict: SaveConflict
  busy: boolean
  problem: string | null
  onSave(message: string, instead: Instead): void
  onTheirs(): void
  onClose(): void
}

/** Somebody saved in between: what each did since the version both began with, and what is to become of it. */
export function MergeDialog({ conflict, busy, problem, onSave, onTheirs, onClose }: Props) {
  const { head, base, yours } = conflict
  const system = useSessionState((state) => state.system)
  const [way, setWay] = useState<Way>('together')
  const [choices, setChoices] = useState<Choices>({})
  const scenes = { base: base.document, theirs: head.document, mine: yours.document }
  const { conflicts, read } = useMemo(
    () => mergeScenes(base.document, head.document, yours.document, choices),
    [base, head, yours, choices],
  )
  const open = conflicts.filter(({ key }) => choices[key] === undefined).length
  const held = heldBy(way, open, read.ok)
  const next = head.number + 1
  const act = () => {
    if (way === 'theirs') return onTheirs()
    if (way === 'own') return onSave(yours.message, { document: yours.document, onTopOf: null })
    if (way === 'mine') return onSave(yours.message, { document: yours.document, onTopOf: head.number })
    if (read.ok)
      onSave(yours.message || `With version ${head.number} brought in`, {
        document: read.scene,
        onTopOf: head.number,
      })
  }
  const deeds: Record<Way, string> = {
    together: `Save both as version ${next}`,
    mine: `Save mine as version ${next}`,
    own: 'Save as a scene of its own',
    theirs: `Open version ${head.number}`,
  }
  return (
    <Dialog
      wide
      title={`Version ${head.number} was saved in between`}
      about={{ k: 'By', v: `${head.author}, ${new Date(head.createdAt).toLocaleString()}` }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Keep mine as a draft
          </button>
          <button
            type="button"
            className={held ? 'btn pri held' : 'btn pri'}
            disabled={busy || held !== null}
            onClick={act}
          >
            {busy ? 'Saving' : deeds[way]}
          </button>
        </>
      }
    >
      <p>
        Yours was made from version {base.number}.{' '}
        {head.message ? `Version ${head.number} says: “${head.message}”. ` : ''}
        Nothing is lost, whichever you choose.
      </p>
      <div className="merge-sides">
        <Side
          title={`Yours since version ${base.number}`}
          from={base.document}
          to={yours.document}
          system={system}
          heads={{ was: `v${base.number}`, now: 'mine' }}
        />
        <Side
          title={`Version ${head.number} since version ${base.number}`}
          from={base.document}
          to={head.document}
          system={system}
          heads={{ was: `v${base.number}`, now: `v${head.number}` }}
        />
      </div>
      <Ways head={head.number} next={next} way={way} onWay={setWay} />
      {way === 'together' && conflicts.length > 0 ? (
        <MergeChoices
          conflicts={conflicts}
          choices={choices}
          head={head.number}
          scenes={scenes}
          system={system}
          onChoose={setChoices}
        />
      ) : null}
      {way === 'together' && !read.ok && open === 0 ? (
        <div className="msg" role="alert">
          {read.issues.map(({ path, code, message, fix }) => (
            <p key={`${path} ${code}`}>
              <b>{message}</b> {fix}
            </p>
          ))}
        </div>
      ) : null}
      <p className="cap" role="status">
        {held ? `held: ${held}` : ''}
      </p>
      {problem ? (
        <p className="msg" role="alert">
          {problem}
        </p>
      ) : null}
    </Dialog>
  )
}

function heldBy(way: Way, open: number, stands: boolean): string | null {
  if (way !== 'together') return null
  if (open > 0)
    return `${open} ${open === 1 ? 'value was' : 'values were'} changed in both and none is chosen yet`
  return stands ? null : 'what each set right by itself cannot stand together'
}

interface WaysProps {
  head: number
  next: number
  way: Way
  onWay(way: Way): void
}

function Ways({ head, next, way, onWay }: WaysProps) {
  const name = useId()
  const ways: { is: Way; title: string; says: string }[] = [
    { is: 'together', title: `Bring version ${head} in`, says: 'what it changed and what you changed' },
    { is: 'mine', title: 'Mine on top', says: `version ${next} is yours alone; ${head} stays in the list` },
    { is: 'own', title: 'A scene of its own', says: 'yours is version 1 of a new scene' },
    { is: 'theirs', title: 'Let mine go', says: 'undo brings it back on the bench' },
  ]
  return (
    <fieldset className="merge-ways">
      <legend className="head">What is to be done?</legend>
      <div className="vopts">
        {ways.map(({ is, title, says }) => (
          <label key={is} className={way === is ? 'vo on' : 'vo'}>
            <input type="radio" name={name} checked={way === is} onChange={() => onWay(is)} />
            <span>
              <b>{title}</b>
              <small>{says}</small>
            </span>
          </label>
        ))}
      </div>
    </fieldset>
  )
}

interface SideProps {
  title: string
  from: Scene
  to: Scene
  system: System
  heads: { was: string; now: string }
}

function Side({ title, from, to, system, heads }: SideProps) {
  const { parameters, view } = useMemo(() => compareScenes(from, to), [from, to])
  const { seen, below } = seenChanges(parameters, system)
  return (
    <section aria-label={title}>
      <h3>{title}</h3>
      {seen.length > 0 ? (
        <ChangeTable
          label={title}
          changes={seen}
          system={system}
          heads={heads}
          numberOf={(change) => rowNumber(change, to)}
        />
      ) : (
        <p>Nothing of the engine was set otherwise.</p>
      )}
      <p className="cap">
        View only: {view.length} {view.length === 1 ? 'change' : 'changes'}. Below display precision:{' '}
        {below.length}.
      </p>
    </section>
  )
}
