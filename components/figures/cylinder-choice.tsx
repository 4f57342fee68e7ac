'use client'

import { useState } from 'react'
import { useResults } from '@/scene/session/react'

/** Which cylinder a note is about: the first that fires until another is chosen. */
export function useCylinderChoice() {
  const { eventsDeg, document } = useResults()
  const [chosen, setChosen] = useState<string | null>(null)
  const known = document.cylinders.some(({ id }) => id === chosen)
  const cylinder = known && chosen ? chosen : eventsDeg[0].id
  const choice =
    document.cylinders.length > 1 ? (
      <label className="pick-label">
        cylinder{' '}
        <select className="pick" value={cylinder} onChange={(event) => setChosen(event.target.value)}>
          {document.cylinders.map(({ id }) => (
            <option key={id}>{id}</option>
          ))}
        </select>
      </label>
    ) : (
      `cylinder ${cylinder}`
    )
  return { cylinder, choice }
}
