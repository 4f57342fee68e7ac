'use client'

import { useId, type ReactNode } from 'react'
import { ChangeList, type ChangeListProps } from './change-list'
import { GhostChoice } from './ghost-choice'
import type { Comparison } from './use-comparison'

/**
 * What changed since another version, for the left column of the review page:
 *
 *   const comparison = useComparison(sceneId, version)      // components/versions/use-comparison
 *   <Changes comparison={comparison} system={system} onPart={setLit} touched={…} numberOf={…} />
 *
 * The drawing reads the same `comparison`: `comparison.beside` and `comparison.drawn`.
 */
export interface ChangesProps extends ChangeListProps {
  comparison: Comparison
  /** Notes touched by this. */
  touched?: ReactNode
}

export function Changes({ comparison, touched, ...shown }: ChangesProps) {
  const { sceneId, version, older } = comparison
  if (older === null)
    return (
      <>
        <h2>What changed</h2>
        <p className="cap">This is the first version: there is nothing before it.</p>
        {touched}
      </>
    )
  return (
    <>
      <h2>Changed since version {older}</h2>
      <OlderChoice comparison={comparison} />
      <ChangeList sceneId={sceneId} from={older} to={version} {...shown} />
      {touched}
      <GhostChoice comparison={comparison} />
    </>
  )
}

function OlderChoice({ comparison: { older, choose, choices } }: { comparison: Comparison }) {
  const id = useId()
  if (choices.length < 2) return null
  return (
    <div className="lf older-choice">
      <label htmlFor={id}>Compared with</label>
      <span className="box">
        <select id={id} value={older ?? ''} onChange={(event) => choose(Number(event.target.value))}>
          {choices.map(({ number, message, author }) => (
            <option key={number} value={number}>
              Version {number}, {message || author}
            </option>
          ))}
        </select>
      </span>
    </div>
  )
}
