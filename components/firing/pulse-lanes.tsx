'use client'

import { useId, useMemo } from 'react'
import { BehindFigure } from '@/components/figures/behind'
import { angleWord } from '@/components/figures/interval-words'
import { ChartFrame } from '@/components/ui/charts/chart-frame'
import { exhaustPulses, type PulseWindow } from '@/lib/mechanics/exhaust-pulses'
import type { Train } from '@/lib/mechanics/train'
import { useResults } from '@/scene/session/react'
import { drawLanes } from './draw-lanes'
import { laneGroups, pulseSentence, pulseTable, spreadWords } from './pulse-words'

interface Props {
  train: Train
  window: PulseWindow
  /** Another grouping than the train's own. */
  groups?: readonly (readonly number[])[]
}

/** Blow-down windows of every cylinder, by collector, with what they share hatched. */
export function PulseLanes({ train, window, groups }: Props) {
  const id = useId()
  const { speedRpm } = useResults()
  const lanes = useMemo(
    () => laneGroups(train, exhaustPulses(train, window, groups), groups !== undefined),
    [train, window, groups],
  )
  return (
    <>
      <ChartFrame
        title="Pulses by collector"
        sentence={pulseSentence(lanes)}
        table={pulseTable(lanes, speedRpm)}
        along={false}
      >
        {(width) => drawLanes({ id, width, lanes, window, cycle: train.cycle })}
      </ChartFrame>
      <ul className="firing-spreads">
        {lanes.map((lane) => (
          <li key={lane.name}>
            {lane.collector !== undefined && lane.pulses.length > 1 ? (
              <BehindFigure behind={{ figure: 'firing-evenness', collector: lane.collector }}>
                {spreadWords(lane)}
              </BehindFigure>
            ) : (
              spreadWords(lane)
            )}
          </li>
        ))}
      </ul>
      <p className="cap">
        Window drawn from exhaust opening for {angleWord((window.length * 180) / Math.PI)}° of crank; hatched
        where another pulse of the same collector is in its own. The worst placed cylinder sets what the
        others may be tuned to.
      </p>
    </>
  )
}
