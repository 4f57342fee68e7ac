'use client'

import { useState } from 'react'
import { FieldNote } from '@/components/ui/field-note'
import { Segmented } from '@/components/ui/segmented'
import { Switch } from '@/components/ui/switch'
import { halfDiscMoment, type WebRoom } from '@/lib/mechanics/balance/half-disc'
import {
  CannotBalance,
  solveCounterweights,
  type Plane,
  type SharingRule,
  type Solved,
} from '@/lib/mechanics/balance/solve-counterweights'
import { quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import { presentPlanes, webPlanes } from '@/scene/frame/web-planes'
import { useBench, useResults, useSessionState } from '@/scene/session/react'

const rules: { value: SharingRule; label: string }[] = [
  { value: 'least-mass', label: 'Least mass' },
  { value: 'even', label: 'Evenly over all' },
  { value: 'bay', label: 'Bay by bay' },
]

const ruleWords: Record<SharingRule, string> = {
  'least-mass': 'The lightest counterweights of all that balance the crank as a whole.',
  even: 'Shared over all webs with the least sum of squares: no web stands out.',
  bay: 'Each bay between two mains by itself, which spares the mains.',
}

/** Counterweights found: by a rule, in the places there are or in all webs, within what they hold or not. */
export function SolveBar({ room, stays }: { room: WebRoom; stays: ReadonlySet<string> }) {
  const { session } = useBench()
  const { document, train } = useResults()
  const system = useSessionState((state) => state.system)
  const [rule, setRule] = useState<SharingRule>('least-mass')
  const [within, setWithin] = useState(false)
  const [said, setSaid] = useState<{ words: string } | { refusal: CannotBalance } | null>(null)

  const solve = (planes: Plane[]) => {
    const capacity = halfDiscMoment(room.radius, room.thickness, room.density)
    const ready = planes.map((plane): Plane => {
      const fixed = stays.has(plane.id) ? train.counterweights.find(({ id }) => id === plane.id) : undefined
      return {
        ...plane,
        ...(within && rule !== 'even' && { most: capacity / plane.radius }),
        ...(fixed && { fixed: { mass: fixed.mass, angle: fixed.angle } }),
      }
    })
    try {
      const solved = solveCounterweights(train, ready, rule)
      session.seal()
      session.edit([{ path: ['train', 'counterweights'], value: inDocument(solved) }])
      setSaid({
        words: `Balanced with ${quantityText(solved.mass, 'mass', system)} of counterweights in all.`,
      })
    } catch (error) {
      if (!(error instanceof CannotBalance)) throw error
      setSaid({ refusal: error })
    }
  }
  const hasOwn = train.counterweights.some(({ radius }) => radius > 0)
  return (
    <div className="solve-bar">
      <div className="balance-tools">
        <Segmented label="Share the weights out" value={rule} options={rules} onChange={setRule} />
        {rule !== 'even' ? (
          <Switch label="Within what each web holds" on={within} onChange={setWithin} />
        ) : null}
        <span className="grow" />
        {hasOwn ? (
          <button type="button" className="btn" onClick={() => solve(webPlanes(document, train))}>
            Set out in all webs
          </button>
        ) : null}
        <button type="button" className="btn pri" onClick={() => solve(presentPlanes(document, train))}>
          {hasOwn ? 'Balance in these places' : 'Balance in all webs'}
        </button>
      </div>
      <p className="cap">{ruleWords[rule]}</p>
      {said && 'refusal' in said ? (
        <FieldNote
          id="cannot-balance"
          head={heads[said.refusal.reason]}
          text={refusalWords(said.refusal, system)}
          mends={[
            ...(hasOwn
              ? [{ label: 'Set out in all webs', run: () => solve(webPlanes(document, train)) }]
              : []),
            { label: 'Leave them as they are', run: () => setSaid(null) },
          ]}
        />
      ) : null}
      <p className="say" aria-live="polite">
        {said && 'words' in said ? said.words : ''}
      </p>
    </div>
  )
}

const inDocument = ({ counterweights }: Solved) =>
  counterweights.map(({ id, axial, angle, mass, radius }) => ({
    id,
    axialMm: fromSi(axial, 'mm'),
    angleDeg: (fromSi(angle, '°') + 360) % 360,
    massKg: mass,
    radiusMm: fromSi(radius, 'mm'),
  }))

const heads: Record<CannotBalance['reason'], string> = {
  'no-plane': 'No web is free.',
  'one-place': 'One place is not enough.',
  full: 'The webs hold too little.',
}

function refusalWords({ reason, force, couple, throws }: CannotBalance, system: System): string {
  const left = `${quantityText(force, 'unbalance', system)} and a couple of ${quantityText(couple, 'coupleUnbalance', system)}`
  const where = throws ? ` of throw ${throws.join(', ')}` : ''
  switch (reason) {
    case 'no-plane':
      return `${left}${where} wait for a counterweight. Let a web go that stays, or set more out.`
    case 'one-place':
      return `Weights at one place along the crank cannot answer ${left}${where}. Set one out at another place.`
    case 'full':
      return `All webs together cannot answer ${left}${where}. Let them go beyond and set slugs, or make them larger.`
  }
}
