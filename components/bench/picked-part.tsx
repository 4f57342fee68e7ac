'use client'

import { useMemo, useRef } from 'react'
import { Icon } from '@/components/ui/icon'
import { formatQuantity } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { partFacts, type PartFigure } from '@/scene/frame/part-figures'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import { useInstant } from './use-instant'

/** The part that was picked on the drawing, with its live figures. */
export function PickedPart() {
  const { session } = useBench()
  const { model, train } = useResults()
  const picked = useSessionState((state) => state.picked)
  const system = useSessionState((state) => state.system)
  const facts = useMemo(
    () => (picked ? partFacts(model.rig, train, picked) : null),
    [model.rig, train, picked],
  )
  if (!facts) return null
  return (
    <div className="picked" role="region" aria-label="Picked part">
      <h3>
        {facts.label}
        <button
          type="button"
          className="btn sm ic"
          aria-label="Put the part back"
          onClick={() => session.pick(null)}
        >
          <Icon name="cross" />
        </button>
      </h3>
      <LiveFigures figures={facts.figures} system={system} />
    </div>
  )
}

function LiveFigures({ figures, system }: { figures: PartFigure[]; system: System }) {
  const list = useRef<HTMLDListElement>(null)
  useInstant((instant) => {
    const cells = list.current!.querySelectorAll('dd')
    figures.forEach((figure, i) => {
      const { text, unit } = formatQuantity(figure.value(instant), figure.quantity, system)
      cells[2 * i].textContent = text
      cells[2 * i + 1].textContent = unit
    })
  })
  return (
    <dl className="kv" ref={list}>
      {figures.map((figure) => (
        <div key={figure.name} className="kv-row">
          <dt>{figure.name}</dt>
          <dd className="n" />
          <dd className="un" />
        </div>
      ))}
    </dl>
  )
}
