import { formatNumber } from '@/lib/units/format'
import type { Search } from './use-search'

/** How far a search is, and the way to stop it or begin it again. */
export function SearchState({ search, noun }: { search: Search<unknown>; noun: string }) {
  const { state, seen, stop, again } = search
  return (
    <span className="firing-search" role="status">
      {state === 'running' ? (
        <>
          <span className="cap">
            Looking through {noun}
            {seen > 0 ? `: ${formatNumber(seen, { decimals: 0 })} so far` : ''}
          </span>
          <button type="button" className="btn sm" onClick={stop}>
            Stop
          </button>
        </>
      ) : state === 'answered' ? null : (
        <>
          <span className="cap">{state === 'stopped' ? 'Stopped.' : 'The search could not run.'}</span>
          <button type="button" className="btn sm" onClick={again}>
            Look again
          </button>
        </>
      )}
    </span>
  )
}
