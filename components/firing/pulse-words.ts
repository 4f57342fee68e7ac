import { angleWord } from '@/components/figures/interval-words'
import type { CollectorPulses } from '@/lib/mechanics/exhaust-pulses'
import type { Train } from '@/lib/mechanics/train'
import { formatNumber } from '@/lib/units/format'
import { fromSi } from '@/lib/units/units'
import type { Table } from '@/lib/tables/table'
import { collectorName } from './edits'

/** A collector with its pulses in degrees, ready to be drawn and said. */
export interface LaneGroup {
  name: string
  /** Of the document, where it is one. */
  collector?: string
  gapSpread: number
  overlapSpread: number
  worst: number
  pulses: { cylinder: string; opens: number; gap: number; overlap: number }[]
}

const degrees = (angle: number) => fromSi(angle, '°')

/** `proposed`: groups that are not the document's collectors yet, named in turn. */
export const laneGroups = (
  train: Train,
  collectors: readonly CollectorPulses[],
  proposed: boolean,
): LaneGroup[] =>
  collectors.map(({ collector, pulses, gapSpread, overlapSpread, worst }) => ({
    name:
      collector === null
        ? `pipe of ${train.cylinders[pulses[0].cylinder].id}`
        : `collector ${proposed ? collectorName(collector) : train.collectors[collector].id}`,
    collector: collector === null || proposed ? undefined : train.collectors[collector].id,
    gapSpread: degrees(gapSpread),
    overlapSpread: degrees(overlapSpread),
    worst,
    pulses: pulses.map(({ cylinder, opens, gap, overlap }) => ({
      cylinder: train.cylinders[cylinder].id,
      opens: degrees(opens),
      gap: degrees(gap),
      overlap: degrees(overlap),
    })),
  }))

export const pulseTable = (lanes: readonly LaneGroup[], speedRpm: number): Table => ({
  title: 'Exhaust pulses',
  columns: [
    { name: 'Collector', unit: '' },
    { name: 'Cylinder', unit: '' },
    { name: 'Exhaust opens at', unit: '°', decimals: 1 },
    { name: 'Since the last pulse', unit: '°', decimals: 1 },
    {
      name: `The same at ${formatNumber(speedRpm, { decimals: 0 })} rpm`,
      unit: 'ms',
      si: { unit: 's', factor: 1e-3 },
      decimals: 2,
    },
    { name: 'Overlap', unit: '°', decimals: 1 },
  ],
  rows: lanes.flatMap(({ name, pulses }) =>
    pulses.map(({ cylinder, opens, gap, overlap }) => [
      name,
      cylinder,
      opens,
      gap,
      milliseconds(gap, speedRpm),
      overlap,
    ]),
  ),
})

/** How long the crank takes for an angle. */
const milliseconds = (angleDeg: number, speedRpm: number) => (1000 * angleDeg) / (6 * speedRpm)

export function pulseSentence(lanes: readonly LaneGroup[]): string {
  const pulses = lanes.flatMap((lane) => lane.pulses)
  const met = pulses.filter(({ overlap }) => overlap > 0.05)
  if (met.length === 0) return 'No two pulses of one collector overlap.'
  const most = met.reduce((worst, pulse) => (pulse.overlap > worst.overlap + 0.05 ? pulse : worst))
  return `${met.length} of ${pulses.length} pulses overlap another of their collector, cylinder ${most.cylinder} most: ${angleWord(most.overlap)}°.`
}

/** Gaps, overlaps and their spread in one collector. */
export function spreadWords({ name, pulses, gapSpread, overlapSpread, worst }: LaneGroup): string {
  const head = `${name.charAt(0).toUpperCase()}${name.slice(1)}`
  if (pulses.length === 1) return `${head}: cylinder ${pulses[0].cylinder} alone.`
  if (gapSpread < 0.5 && overlapSpread < 0.5)
    return `${head}: all alike, ${angleWord(pulses[0].gap)}° after the last pulse, overlap ${angleWord(pulses[0].overlap)}°.`
  const { cylinder, gap, overlap } = pulses[worst]
  return `${head}: gaps differ by ${angleWord(gapSpread)}°, overlaps by ${angleWord(overlapSpread)}°. Worst placed is cylinder ${cylinder}, ${angleWord(gap)}° after the last pulse, overlap ${angleWord(overlap)}°.`
}
