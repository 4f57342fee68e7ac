'use client'

import { useCallback, useMemo, useState } from 'react'
import { intervalWords } from '@/components/figures/interval-words'
import { LeafSection } from '@/components/figures/leaf'
import { DataTable } from '@/components/ui/data-table'
import { Segmented } from '@/components/ui/segmented'
import { usualWindow, type PulseWindow } from '@/lib/mechanics/exhaust-pulses'
import type { CollectorGrouping } from '@/lib/mechanics/collector-groups'
import type { Train } from '@/lib/mechanics/train'
import { fromSi } from '@/lib/units/units'
import type { Table } from '@/lib/tables/table'
import { useBench, useResults } from '@/scene/session/react'
import { findCollectorGroups } from '@/scene/session/search/find-collector-groups'
import type { SearchControl } from '@/scene/session/search/run-search'
import { collectorChanges } from './edits'
import { namesOf } from './order-words'
import { PulseLanes } from './pulse-lanes'
import { PulseWindowFields } from './pulse-window-fields'
import { RhythmSection } from './rhythm-section'
import { SearchState } from './search-state'
import { useSearch } from './use-search'

const MOST = 4
const degrees = (angle: number) => fromSi(angle, '°')

/** Groupings into collectors, the pulses of one of them, and its rhythm. */
export function CollectorSections() {
  const { train, document } = useResults()
  const { session } = useBench()
  const most = Math.min(MOST, train.cylinders.length)
  const [wanted, setWanted] = useState<number | null>(null)
  const count = Math.min(most, wanted ?? Math.max(1, Math.min(most, document.collectors.length, 2)))
  const usual = useMemo(() => usualWindow(train), [train])
  const [own, setOwn] = useState<Partial<PulseWindow>>({})
  const window = useMemo(() => fitting({ ...usual, ...own }, train.cycle), [usual, own, train.cycle])
  const [chosenName, setChosenName] = useState<string | null>(null)
  const search = useSearch(
    useCallback(
      async (control: SearchControl<number>) => ({
        train,
        ...(await findCollectorGroups({ train, count, window }, control)),
      }),
      [train, count, window],
    ),
  )
  const { answer } = search
  const fresh = answer?.train === train
  const chosen = fresh ? answer.groupings.findIndex((grouping) => nameOf(train, grouping) === chosenName) : -1
  const grouping = fresh && chosen >= 0 ? answer.groupings[chosen] : null
  const groups = grouping?.groups.map(({ cylinders }) => cylinders)
  const presentName = document.collectors.map(({ cylinders }) => cylinders.join('-')).join(' + ')

  return (
    <>
      <LeafSection title="Collectors" at={presentName ? `now ${presentName}` : 'now a pipe each'} wide>
        <div className="firing-tools">
          <Segmented
            label="Number of collectors"
            value={String(count)}
            options={Array.from({ length: most }, (_, index) => ({
              value: String(index + 1),
              label: String(index + 1),
            }))}
            onChange={(value) => setWanted(Number(value))}
          />
          <span className="cap">{count === 1 ? 'collector' : 'collectors'}</span>
          <SearchState search={search} noun="groupings" />
        </div>
        {answer ? (
          <div className={search.state === 'answered' ? 'firing-answer' : 'firing-answer stale'}>
            <DataTable
              table={groupingTable(answer.train, answer.groupings)}
              chosen={chosen < 0 ? null : chosen}
              onChoose={(row) => {
                const name = nameOf(answer.train, answer.groupings[row])
                setChosenName(name === chosenName ? null : name)
              }}
            />
            {answer.complete ? null : (
              <p className="cap">Not every grouping was tried; these are the best of those that were.</p>
            )}
          </div>
        ) : null}
        <p className="firing-take">
          <button
            type="button"
            className="btn"
            disabled={!grouping}
            onClick={() => {
              if (!grouping) return
              session.edit(
                collectorChanges(grouping.groups.map(({ cylinders }) => namesOf(train, cylinders))),
              )
              setChosenName(null)
            }}
          >
            {grouping ? `Take ${nameOf(train, grouping)}` : 'Take a grouping'}
          </button>
          {grouping ? (
            <button type="button" className="btn txt" onClick={() => setChosenName(null)}>
              Back to the present collectors
            </button>
          ) : (
            <span className="cap">Choose a row to see its pulses.</span>
          )}
        </p>
      </LeafSection>
      <LeafSection
        title="Exhaust pulses"
        at={grouping ? `if led as ${nameOf(train, grouping)}` : 'as the collectors are now'}
        wide
      >
        <PulseWindowFields usual={usual} own={own} cycle={train.cycle} onOwn={setOwn} />
        <PulseLanes train={train} window={window} groups={groups} />
      </LeafSection>
      <RhythmSection train={train} window={window} groups={groups} />
    </>
  )
}

/** A window never longer than the cycle, nor opening after it. */
const fitting = ({ opens, length }: PulseWindow, cycle: number): PulseWindow => ({
  opens: Math.min(opens, cycle),
  length: Math.min(length, cycle),
})

const nameOf = (train: Train, { groups }: CollectorGrouping) =>
  groups.map(({ cylinders }) => namesOf(train, cylinders).join('-')).join(' + ')

const groupingTable = (train: Train, groupings: readonly CollectorGrouping[]): Table => ({
  title: 'Best groupings, in firing order within each collector',
  columns: [
    { name: 'Collectors', unit: '' },
    { name: 'Intervals', unit: '' },
    { name: 'Worst spread', unit: '°', decimals: 1 },
    { name: 'All spreads', unit: '°', decimals: 1 },
    { name: 'Overlap', unit: '°', decimals: 1 },
    { name: 'Banks crossed', unit: '', decimals: 0 },
  ],
  rows: groupings.map((grouping) => [
    nameOf(train, grouping),
    grouping.groups
      .map(({ intervals, spread }) => intervalWords(intervals.map(degrees), degrees(spread) < 0.5))
      .join(' + '),
    degrees(grouping.worstSpread),
    degrees(grouping.totalSpread),
    degrees(grouping.overlap),
    grouping.crossings,
  ]),
})
