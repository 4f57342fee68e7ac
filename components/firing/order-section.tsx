'use client'

import { useCallback, useMemo, useState } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { DataTable } from '@/components/ui/data-table'
import { Segmented } from '@/components/ui/segmented'
import { MOST_CYLINDERS, rankOrder } from '@/lib/mechanics/firing-ranking'
import { formatNumber } from '@/lib/units/format'
import { fromSi } from '@/lib/units/units'
import { useBench, useResults } from '@/scene/session/react'
import { findFiringOrders } from '@/scene/session/search/find-firing-orders'
import type { SearchControl } from '@/scene/session/search/run-search'
import { orderChanges, turnsChanges } from './edits'
import { OrderComparison } from './order-comparison'
import { namesOf, orderName, orderTable, turnedTo, whyNoneEven } from './order-words'
import { SearchState } from './search-state'
import { useSearch } from './use-search'

/** Every order the crank allows, ranked; one of them beside the present one; and the way to take it. */
export function OrderSection() {
  const { train, document } = useResults()
  const { session } = useBench()
  const many = train.cylinders.length > MOST_CYLINDERS && document.cycle === 'four-stroke'
  const present = useMemo(
    () =>
      rankOrder(
        train,
        train.firingOrder,
        train.cylinders.map(({ firesAt }) => firesAt),
      ),
    [train],
  )
  const [wanted, setWanted] = useState<'even' | 'all' | null>(null)
  const even = many || (wanted ?? (present.spread < 0.01 ? 'even' : 'all')) === 'even'
  const [chosenName, setChosenName] = useState<string | null>(null)
  const search = useSearch(
    useCallback(
      async (control: SearchControl<number>) => ({
        train,
        ...(await findFiringOrders({ train, even }, control)),
      }),
      [train, even],
    ),
  )
  const { answer } = search
  const listed = useMemo(() => {
    if (!answer) return null
    const first = answer.train.firingOrder[0]
    return { ...answer, orders: answer.orders.map((ranked) => turnedTo(ranked, first)) }
  }, [answer])
  const presentName = orderName(train, present)
  const chosen = listed
    ? listed.orders.findIndex((ranked) => orderName(listed.train, ranked) === chosenName)
    : -1
  const chosenOrder = listed && chosen >= 0 ? namesOf(listed.train, listed.orders[chosen].order) : []
  const table = useMemo(
    () => listed && orderTable(listed.train, listed.orders, presentName),
    [listed, presentName],
  )

  return (
    <LeafSection title="Orders the crank allows" at={`now ${presentName}`} wide>
      <div className="firing-tools">
        <Segmented
          label="Which orders"
          value={even ? 'even' : 'all'}
          options={[
            { value: 'even', label: 'Even' },
            { value: 'all', label: 'All' },
          ]}
          onChange={setWanted}
        />
        <SearchState search={search} noun="orders" />
      </div>
      {many ? (
        <p className="cap">
          All orders are looked through up to {MOST_CYLINDERS} cylinders; this train has{' '}
          {train.cylinders.length}, so the even ones are listed.
        </p>
      ) : null}
      {listed && table ? (
        <div className={search.state === 'answered' ? 'firing-answer' : 'firing-answer stale'}>
          <p>{foundWords(listed.found, listed.orders.length, listed.complete, even)}</p>
          {listed.orders.length === 0 ? (
            <p className="cap">{whyNoneEven(train)}</p>
          ) : (
            <DataTable
              table={table}
              chosen={chosen < 0 ? null : chosen}
              onChoose={(row) => setChosenName(orderName(listed.train, listed.orders[row]))}
              page={20}
            />
          )}
          <p className="cap">
            Spread: longest less shortest interval. Same bank, same throw, next throw: how often a firing
            follows another there, all the way round. In a collector: the worst spread within one of the
            present collectors.
          </p>
        </div>
      ) : null}
      {listed && chosen >= 0 ? (
        <OrderComparison
          train={listed.train}
          present={present}
          chosen={listed.orders[chosen]}
          onTake={() => session.edit(orderChanges(document, chosenOrder))}
          onTurns={(angles) =>
            session.edit(
              turnsChanges(
                document,
                chosenOrder,
                angles.map((angle) => fromSi(angle, '°')),
              ),
            )
          }
        />
      ) : null}
    </LeafSection>
  )
}

function foundWords(found: number, kept: number, complete: boolean, even: boolean): string {
  const number = (count: number) => formatNumber(count, { decimals: 0 })
  const orders = `${found === 1 ? 'One' : number(found)} ${even ? 'even ' : ''}order${found === 1 ? '' : 's'}`
  if (found === 0) return even ? 'No even order.' : 'No order.'
  const cut = kept < found ? ` The best ${number(kept)} are listed.` : ''
  return complete ? `${orders}.${cut}` : `${orders} looked at, and there are more.${cut}`
}
