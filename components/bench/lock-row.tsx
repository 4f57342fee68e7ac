'use client'

import { Icon } from '@/components/ui/icon'
import { quantityText } from '@/lib/units/format'
import { deckOf, displacementOf, type Locks } from '@/scene/session/locks'
import { useBench, useSessionState } from '@/scene/session/react'

const words: Record<keyof Locks, { label: string; follows: string }> = {
  displacement: { label: 'Hold displacement', follows: 'bore and stroke follow each other' },
  deck: { label: 'Hold deck height', follows: 'compression height follows rod and stroke' },
}

/** What is held while something else is changed: a padlock, the word and the value that stays. */
export function LockRow({ lock, number }: { lock: keyof Locks; number: number }) {
  const { session } = useBench()
  const held = useSessionState((state) => state.locks[lock])
  const train = useSessionState(({ scene }) => scene.train)
  const system = useSessionState((state) => state.system)
  const { label, follows } = words[lock]
  const deck = deckOf(train)
  const missing = lock === 'deck' && deck === undefined
  const value =
    lock === 'displacement'
      ? quantityText(displacementOf(train) / 1e9, 'volume', system)
      : deck === undefined
        ? 'no compression height given'
        : quantityText(deck / 1000, 'length', system)
  return (
    <tr className="free lock" data-row={`lock.${lock}`}>
      <td className="no">
        <span className="ball">{number}</span>
      </td>
      <th scope="row">
        {label}
        {held ? <span className="cap"> {follows}</span> : null}
      </th>
      <td className="wideval r" colSpan={2}>
        <button
          type="button"
          className="btn sm"
          role="switch"
          aria-checked={held}
          aria-label={`${label}, ${value}`}
          disabled={missing}
          onClick={() => session.setLock(lock, !held)}
        >
          <Icon name={held ? 'locked' : 'unlocked'} /> {held ? 'held' : 'free'}
        </button>{' '}
        <span className="fig">{value}</span>
      </td>
    </tr>
  )
}
