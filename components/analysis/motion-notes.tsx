'use client'

import { formatQuantity } from '@/lib/units/format'
import { useResults, useSessionState } from '@/scene/session/react'
import { useCylinderChoice } from '@/components/figures/cylinder-choice'
import { CycleChart } from '@/components/figures/cycle-chart'
import { FiringNotes } from './firing-notes'
import { Figures, Note } from '@/components/figures/note'
import { least, most } from '@/components/figures/signal'

const SI = 1000

export function MotionNotes() {
  const { analysis } = useResults()
  const system = useSessionState((state) => state.system)
  const { cylinder, choice } = useCylinderChoice()
  const motion = analysis.kinematics[cylinder]
  const { angleDeg } = analysis
  const downwards = Float64Array.from(motion.travelMm, (travel) => travel / SI)
  const down = least(motion.velocityMS, angleDeg)
  const up = most(motion.velocityMS, angleDeg)
  const fast = up.value >= -down.value ? up : down
  const low = least(motion.accelerationMS2, angleDeg)
  const high = most(motion.accelerationMS2, angleDeg)
  return (
    <>
      <FiringNotes />
      <Note title="Piston travel" at={choice}>
        <Figures
          rows={[
            {
              name: 'Top dead centre at',
              figure: { text: motion.tdcDeg.toFixed(2), unit: '°' },
              behind: { figure: 'top-dead-centre', cylinder },
            },
            {
              name: 'Bottom dead centre at',
              figure: { text: motion.bdcDeg.toFixed(2), unit: '°' },
              behind: { figure: 'bottom-dead-centre', cylinder },
            },
            {
              name: 'True stroke',
              behind: { figure: 'true-stroke', cylinder },
              figure: formatQuantity(motion.strokeMm / SI, 'length', system, {
                decimals: system === 'si' ? 2 : 4,
              }),
            },
          ]}
        />
        <CycleChart
          name={`Travel of piston ${cylinder} from top dead centre`}
          quantity="length"
          series={[{ name: 'travel', look: 'v', values: downwards }]}
        />
      </Note>
      <Note title="Piston velocity" at={`cylinder ${cylinder}`}>
        <Figures
          rows={[
            {
              name: `Most, at ${fast.at}°`,
              figure: formatQuantity(Math.abs(fast.value), 'velocity', system),
              behind: { figure: 'piston-velocity', cylinder, angleDeg: fast.at },
            },
            {
              name: 'Mean',
              figure: formatQuantity(analysis.train.meanPistonSpeedMS, 'velocity', system),
              behind: 'mean-piston-speed',
            },
          ]}
        />
        <CycleChart
          name={`Velocity of piston ${cylinder}`}
          quantity="velocity"
          series={[{ name: 'velocity', look: 'v', values: motion.velocityMS }]}
        />
      </Note>
      <Note title="Piston acceleration" at={`cylinder ${cylinder}`}>
        <Figures
          rows={[
            {
              name: `Downward, at ${low.at}°`,
              figure: formatQuantity(low.value, 'acceleration', system),
              behind: { figure: 'piston-acceleration', cylinder, angleDeg: low.at },
            },
            {
              name: `Upward, at ${high.at}°`,
              figure: formatQuantity(high.value, 'acceleration', system),
              behind: { figure: 'piston-acceleration', cylinder, angleDeg: high.at },
            },
          ]}
        />
        <CycleChart
          name={`Acceleration of piston ${cylinder}`}
          quantity="acceleration"
          series={[{ name: 'acceleration', look: 'inertia', values: motion.accelerationMS2 }]}
        />
      </Note>
    </>
  )
}
