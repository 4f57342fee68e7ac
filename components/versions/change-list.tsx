'use client'

import { useState } from 'react'
import useSWR from 'swr'
import { Caution } from '@/components/figures/caution'
import { ChangeTable } from '@/components/figures/change-table'
import { addressOf, readAddress, Refusal } from '@/lib/contracts/call'
import type { VersionChangesAnswer } from '@/lib/contracts/versions'
import { formatNumber, plainNumber, withUnit } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import type { Value } from '@/scene/model/change-words'
import { seenChanges, type SceneChange } from '@/scene/model/compare-scenes'
import { changesOf } from './changes-of'
import { partWords } from './part-words'
import { immutable } from './use-comparison'

export interface ChangeListProps {
  system: System
  /** Lights parts in the drawing, by their ids. */
  onPart?(parts: readonly string[]): void
  /** The number of the row of the parts list that a change stands in. */
  numberOf?(change: SceneChange): number | null
}

interface Props extends ChangeListProps {
  sceneId: string
  from: number
  to: number
}

/** What changed from one version to another, as the server works it out. */
export function ChangeList({ sceneId, from, to, ...shown }: Props) {
  const { data, error } = useSWR<VersionChangesAnswer, Error>(
    addressOf('/api/v1/scenes/{id}/changes', { id: sceneId }, { from, to, units: shown.system }),
    readAddress,
    immutable,
  )
  if (error)
    return (
      <p className="cap" role="alert">
        {error instanceof Refusal
          ? `${error.problem.detail} ${error.problem.cure}`
          : 'The changes could not be read. Load the page again.'}
      </p>
    )
  if (!data) return <p className="cap">Setting both versions beside each other</p>
  return (
    <>
      <p className="cap">
        by {data.to.author}, {when.format(new Date(data.to.createdAt))}
        {data.to.message ? `: “${data.to.message}”` : ''}
      </p>
      <Found answer={data} {...shown} />
    </>
  )
}

const when = new Intl.DateTimeFormat('en-GB', {
  ...{ day: 'numeric', month: 'long', hour: '2-digit', minute: '2-digit' },
})

function Found({ answer, ...shown }: ChangeListProps & { answer: VersionChangesAnswer }) {
  const [all, setAll] = useState(false)
  const { from, to, speedRpm, drawn } = answer
  const { parameters, view, effects } = changesOf(answer)
  const { seen, below } = seenChanges(parameters, shown.system)
  const heads = { was: `v${from.number}`, now: `v${to.number}` }
  const at = `at ${formatNumber(speedRpm, { decimals: 0 })} rpm`
  const figured = effects.length > 0 || seen.some((change) => change.effects.length > 0)
  const several = seen.length > 1 ? 'of these together' : 'of it'
  return (
    <>
      {seen.length > 0 || effects.length > 0 ? (
        <ChangeTable
          {...shown}
          heads={heads}
          label={`Changed from version ${from.number} to ${to.number}`}
          changes={seen}
          effects={{ title: `Effects ${several}`, rows: effects }}
        />
      ) : (
        <p>Nothing of the engine was set otherwise.</p>
      )}
      {figured ? <p className="cap">Forces and loads {at}.</p> : null}
      <DrawnOtherwise drawn={drawn} onPart={shown.onPart} />
      <p className="cap">
        View only: {view.length} {view.length === 1 ? 'change' : 'changes'}. Below display precision:{' '}
        {below.length}.{' '}
        {view.length + below.length > 0 ? (
          <button type="button" className="part-link" aria-expanded={all} onClick={() => setAll(!all)}>
            {all ? 'Hide them' : 'Show them'}
          </button>
        ) : null}
      </p>
      {all
        ? below.map((change) => (
            <p key={change.key} className="cap">
              {change.name}: {inFull(change.was, change)}, now {inFull(change.now, change)}
            </p>
          ))
        : null}
      {all && view.length > 0 ? (
        <ChangeTable {...shown} heads={heads} label="View only" changes={view} />
      ) : null}
      {figured ? <Caution /> : null}
    </>
  )
}

/** Below display precision the usual digits would say the same twice. */
const inFull = (value: Value, { unit }: ReturnType<typeof changesOf>['parameters'][number]) =>
  typeof value === 'number' ? withUnit(plainNumber(fromSi(value, unit)), unit) : value

interface DrawnProps {
  drawn: VersionChangesAnswer['drawn']
  onPart?(parts: readonly string[]): void
}

function DrawnOtherwise({ drawn: { changed, added, removed }, onPart }: DrawnProps) {
  const said: [string, string[]][] = [
    ['Drawn otherwise', changed],
    ['New', added],
    ['Gone', removed],
  ]
  return said.map(([name, parts]) =>
    parts.length === 0 ? null : (
      <p key={name} className="cap">
        {name}:{' '}
        {onPart && parts !== removed ? (
          <button type="button" className="part-link" onClick={() => onPart(parts)}>
            {partWords(parts)}
          </button>
        ) : (
          partWords(parts)
        )}
        .
      </p>
    ),
  )
}
