'use client'

import { formatQuantity } from '@/lib/units/format'
import { useResults, useSessionState } from '@/scene/session/react'
import { useCylinderChoice } from './cylinder-choice'
import { CycleChart } from './cycle-chart'
import { FiringNotes } from './firing-notes'
import { Figures, Note } from './note'
import { largest, least, most } from './signal'

const SI = 1000

export function MotionNotes() {
  const { analysis } = useResults()
  const system = useSessionState((state) => state.system)
  const { cylinder, choice } = useCylinderChoice()
  const motion = analysis.kinematics[cylinder]
  const { angleDeg } = analysis
  const downwards = Float64Array.from(motion.travelMm, (travel) => travel / SI)
  const fast = largest(motion.velocityMS)
  const low = least(motion.accelerationMS2, angleDeg)
  const high = most(motion.accelerationMS2, angleDeg)
  return (
    <>
      <FiringNotes />
      <Note title="Piston travel" at={choice}>
        <Figures
          rows={[
            { name: 'Top dead centre at', figure: { text: motion.tdcDeg.toFixed(2), unit: '°' } },
            { name: 'Bottom dead centre at', figure: { text: motion.bdcDeg.toFixed(2), unit: '°' } },
            {
              name: 'True stroke',
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
            { name: 'Most', figure: formatQuantity(fast, 'velocity', system) },
            { name: 'Mean', figure: formatQuantity(analysis.train.meanPistonSpeedMS, 'velocity', system) },
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
            { name: `Downward, at ${low.at}°`, figure: formatQuantity(low.value, 'acceleration', system) },
            { name: `Upward, at ${high.at}°`, figure: formatQuantity(high.value, 'acceleration', system) },
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
