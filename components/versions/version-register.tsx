'use client'

import Link from 'next/link'
import { useState } from 'react'
import { Slips, useSlip } from '@/components/ui/slips'
import type { Operation } from '@/lib/auth/access'
import type { VersionSummary } from '@/lib/contracts/scenes'
import { stateWords } from '@/lib/review/version-states'
import { ChangeList, type ChangeListProps } from './change-list'
import { RestoreDialog } from './restore-dialog'
import { useUnits } from './use-units'
import { useVersions } from './use-versions'

interface Props extends Pick<ChangeListProps, 'numberOf'> {
  sceneId: string
  title: string
  may: Operation[]
}

export const VersionRegister = (props: Props) => (
  <Slips>
    <Register {...props} />
  </Slips>
)

/** The versions of a scene, and what changed between any two of them. */
function Register({ sceneId, title, may, numberOf }: Props) {
  const { versions, loading, error, more, refresh } = useVersions(sceneId)
  const [pair, setPair] = useState<{ from: number; to: number } | null>(null)
  const [restoring, setRestoring] = useState<number | null>(null)
  const system = useUnits()
  const slip = useSlip()
  const head = versions[0]?.number ?? 0
  const { from, to } = pair ?? { from: versions[0]?.parent ?? head, to: head }
  return (
    <>
      <section className="reg" aria-label="Versions">
        <div className="regtop">
          <h2>Versions</h2>
        </div>
        {error ? (
          <div className="state" role="alert">
            <p>
              <b>The versions are out of reach.</b>
              <br />
              <button type="button" className="btn txt" onClick={() => void refresh()}>
                Try now
              </button>
            </p>
          </div>
        ) : loading ? (
          <div className="state">
            <p>Setting out the versions</p>
          </div>
        ) : (
          <table className="vert">
            <thead>
              <tr>
                <th scope="col">From</th>
                <th scope="col">To</th>
                <th scope="col">Version</th>
                <th scope="col">Saved by</th>
                <th scope="col">Made from</th>
                <th scope="col">State</th>
                <th scope="col">
                  <span className="vh">Actions</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {versions.map((version) => (
                <VersionRow
                  key={version.number}
                  sceneId={sceneId}
                  version={version}
                  latest={version.number === head}
                  pair={{ from, to }}
                  may={may}
                  onPair={setPair}
                  onRestore={() => setRestoring(version.number)}
                />
              ))}
            </tbody>
          </table>
        )}
        {more ? (
          <p className="reg-more">
            <button type="button" className="btn" onClick={more}>
              Show older versions
            </button>
          </p>
        ) : null}
      </section>
      <section className="notes" aria-label="What changed">
        {head === 0 ? null : from === to ? (
          <>
            <h2>What changed</h2>
            <p>
              {head === 1
                ? 'This is the first version: there is nothing before it.'
                : 'Choose two versions that are not the same.'}
            </p>
          </>
        ) : (
          <>
            <h2>
              From version {from} to {to}
            </h2>
            <ChangeList sceneId={sceneId} from={from} to={to} system={system} numberOf={numberOf} />
          </>
        )}
      </section>
      {restoring === null ? null : (
        <RestoreDialog
          {...{ sceneId, title, head }}
          number={restoring}
          onClose={() => setRestoring(null)}
          onOvertaken={() => void refresh()}
          onRestored={(number) => {
            setRestoring(null)
            setPair(null)
            void refresh()
            slip({ text: `Version ${number} is as version ${restoring} was.` })
          }}
        />
      )}
    </>
  )
}

interface RowProps {
  sceneId: string
  version: VersionSummary
  latest: boolean
  pair: { from: number; to: number }
  may: Operation[]
  onPair(pair: { from: number; to: number }): void
  onRestore(): void
}

const when = new Intl.DateTimeFormat('en-GB', {
  ...{ day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' },
})

function VersionRow({ sceneId, version, latest, pair, may, onPair, onRestore }: RowProps) {
  const { number, parent, message, author, createdAt, state } = version
  const pick = (end: 'from' | 'to') => (
    <td className="pick">
      <label>
        <input
          type="radio"
          name={end}
          aria-label={`Compare ${end} version ${number}`}
          checked={pair[end] === number}
          onChange={() => onPair({ ...pair, [end]: number })}
        />
      </label>
    </td>
  )
  return (
    <tr className={latest ? 'is-head' : undefined}>
      {pick('from')}
      {pick('to')}
      <th scope="row">
        <b>Version {number}</b>
        <span className="cap">{message || 'no words'}</span>
      </th>
      <td className="wide-cell">
        {author}
        <span className="cap">{when.format(new Date(createdAt))}</span>
      </td>
      <td className="wide-cell">{parent === null ? 'nothing' : `version ${parent}`}</td>
      <td className="wide-cell">{stateWords[state]}</td>
      <td className="row-acts wide-cell">
        <Link className="btn txt sm" href={`/bench?scene=${sceneId}&version=${number}`} prefetch={false}>
          Bench<span className="vh"> with version {number}</span>
        </Link>
        {may.includes('review.read') ? (
          <Link className="btn txt sm" href={`/scenes/${sceneId}/review?version=${number}`} prefetch={false}>
            Review<span className="vh"> version {number}</span>
          </Link>
        ) : null}
        {may.includes('scene.save') && !latest ? (
          <button type="button" className="btn txt sm" onClick={onRestore}>
            Restore…<span className="vh"> version {number}</span>
          </button>
        ) : null}
      </td>
    </tr>
  )
}
