'use client'

import { useCallback, useMemo } from 'react'
import { useCrankAngle } from '@/components/figures/cycle-chart'
import { PolarChart } from '@/components/ui/charts/polar-chart'
import { bearingSignal, turnedSignal } from '@/lib/mechanics/loads/bearings'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import type { LoadPart } from '@/lib/mechanics/loads/part-signals'
import { quantityText } from '@/lib/units/format'
import { toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import { crankAngleAxis, DEGREES, degreesText, quantityAxis } from '@/components/figures/axis'
import { directionsOf, type Frame } from './bearing-words'
import type { BearingAtSpeed } from './use-bearings'

const looks = { gas: 'gas', inertia: 'inertia', total: 'res' } as const

interface Props {
  parts: CycleParts
  of: BearingAtSpeed
  frame: Frame
  /** The last of them carries the marks. */
  shown: LoadPart[]
}

/** The path of a bearing's load over one cycle, with the instant of the clock on it. */
export function BearingPolar({ parts, of, frame, shown }: Props) {
  const { speedRpm, cycleDeg } = useResults()
  const system = useSessionState((state) => state.system)
  const { bearing, area, name, figures, journal, block } = of
  const signals = useMemo(
    () =>
      shown.map((part) => {
        const load = bearingSignal(parts, bearing, part, toSi(speedRpm, 'rpm'))
        const own = turnedSignal(load, bearing.stand)
        return frame === 'block'
          ? { part, up: load.vertical, right: load.horizontal }
          : { part, up: own.radial, right: own.tangential }
      }),
    [parts, bearing, shown, frame, speedRpm],
  )
  const degrees = useMemo(() => parts.angle.map((angle) => angle * DEGREES), [parts])
  const axis = quantityAxis('Load', 'force', figures.peak, system)
  const crankAngle = useCrankAngle()
  const count = degrees.length
  const follow = useCallback(
    (move: (index: number) => void) =>
      crankAngle((angleDeg) => move(Math.round((angleDeg / cycleDeg) * count) % count)),
    [crankAngle, cycleDeg, count],
  )
  const last = signals[signals.length - 1]
  const sector = frame === 'block' ? block : journal
  const peak = quantityText(figures.peak, 'force', system)
  return (
    <PolarChart
      title={`Load of ${name}`}
      sentence={`Total load of ${name} over ${cycleDeg}°, ${frame === 'block' ? 'as the block sees it' : 'turning with the journal'}: most ${peak} at ${degreesText(figures.peakAngle)} crank angle, mean ${quantityText(figures.mean, 'force', system)}.`}
      track={{ ...crankAngleAxis, values: degrees }}
      size={axis}
      loops={signals.map(({ part, up, right }) => ({
        name: part,
        look: looks[part],
        up: axis.all(up),
        right: axis.all(right),
      }))}
      directions={directionsOf(bearing, frame)}
      sector={
        sector
          ? { fromDeg: sector.from * DEGREES, toDeg: sector.to * DEGREES, name: 'least loaded' }
          : undefined
      }
      marks={last.part === 'total' ? [{ index: figures.peakSample, text: peak }] : []}
      remark={
        area === undefined
          ? undefined
          : (index) =>
              `${last.part} ${quantityText(Math.hypot(last.up[index], last.right[index]) / area, 'stress', system)} on its area`
      }
      follow={follow}
      height={380}
    />
  )
}
