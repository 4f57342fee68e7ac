'use client'

import { useMemo, useState } from 'react'
import { behindCell } from '@/components/figures/behind-cell'
import { behindClearance } from '@/components/figures/behind-clearance'
import { Leaf, LeafSection, useOpenLeaf } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import { DocumentField } from '@/components/figures/document-field'
import { useClearances } from '@/components/figures/use-clearances'
import { DataTable } from '@/components/ui/data-table'
import { useSlip } from '@/components/ui/slips'
import type { System } from '@/lib/units/quantities'
import type { ClearanceList, ListedClearance } from '@/scene/frame/clearance-list'
import { clearanceSentence } from '@/scene/frame/clearance-words'
import { deckHeightField } from '@/scene/session/clearance-fields'
import { useBench, useSessionState } from '@/scene/session/react'
import { ChosenClearance } from './chosen-clearance'
import { clearanceTable, GAP } from './clearance-table'
import { ClearanceMark } from './status'

/** What comes near what over a turn of the crank, how near, and where. */
export function ClearancesLeaf() {
  const list = useClearances()
  const { clearances, notKnown } = list
  const system = useSessionState((state) => state.system)
  const [chosenId, setChosenId] = useState<string | null>(null)
  const go = useGoTo()
  const table = useMemo(
    () => clearanceTable({ ...list, clearances, notKnown }, system),
    [list, clearances, notKnown, system],
  )
  const at = Math.max(
    0,
    clearances.findIndex(({ id }) => id === chosenId),
  )
  const chosen = clearances[at]
  return (
    <Leaf title="Clearances" sentence={summary(list, system)}>
      {chosen ? <ChosenClearance {...list} clearance={chosen} onGo={go} /> : null}
      <LeafSection title="All pairs" at="the tightest against its limit first" wide>
        <DataTable
          table={table}
          chosen={at}
          onChoose={(row) => clearances[row] && setChosenId(clearances[row].id)}
          figure={behindCell(table, (row, column) =>
            column === GAP && clearances[row]
              ? behindClearance(clearances[row], list.results.train, list.sizes)
              : undefined,
          )}
          more={{
            head: 'Instant',
            cell: (row) =>
              clearances[row] ? (
                <span className="clearance-row">
                  <ClearanceMark status={clearances[row].status} bare />
                  <button
                    type="button"
                    className="btn sm"
                    aria-label={`Go to ${clearances[row].labels.join(' and ')}`}
                    onClick={(event) => {
                      event.stopPropagation()
                      go(clearances[row])
                    }}
                  >
                    Go to it
                  </button>
                </span>
              ) : null,
          }}
        />
      </LeafSection>
      <LeafSection title="Not known">
        {notKnown.length > 0 ? (
          notKnown.map(({ name, why }) => (
            <p key={name}>
              <b>{name}</b>: {why}
            </p>
          ))
        ) : (
          <p>Nothing: every clearance has its figures.</p>
        )}
        <DocumentField field={deckHeightField} />
      </LeafSection>
      <LeafSection title="What is looked at">
        <p className="cap">
          Every pair over one turn of a rigid crank, cold, as the document has it: no play in bearings, no
          piston tilt, no growth by heat or speed. Limits are common practice: 1.5 mm between running parts, 4
          mm of wall between bores, a crown no higher than the deck.
        </p>
      </LeafSection>
      <Caution />
    </Leaf>
  )
}

/** Turns to the drawing at the instant of the least gap, with the two parts lit. */
function useGoTo() {
  const { session, clock } = useBench()
  const open = useOpenLeaf()
  const slip = useSlip()
  const system = useSessionState((state) => state.system)
  return (clearance: ListedClearance) => {
    clock.pause()
    if (clearance.angle !== null) clock.setAngle(clearance.angle)
    session.point(clearance.parts)
    open('drawing')
    slip({ text: clearanceSentence(clearance, system) })
  }
}

function summary({ clearances }: ClearanceList, system: System): string {
  if (clearances.length === 0) return 'Nothing in this engine comes near anything else.'
  const count = (status: ListedClearance['status']) =>
    clearances.filter((one) => one.status === status).length
  const [touching, close] = [count('touches'), count('close')]
  const words =
    touching + close === 0
      ? `All ${clearances.length} pairs keep their limits.`
      : [
          touching > 0 ? `${touching} of ${clearances.length} pairs touch.` : '',
          close > 0 ? `${close} of ${clearances.length} are closer than usual.` : '',
        ]
          .filter(Boolean)
          .join(' ')
  return `${words} Tightest: ${clearanceSentence(clearances[0], system)}`
}
