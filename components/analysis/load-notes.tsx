'use client'

import { formatQuantity } from '@/lib/units/format'
import { scaleFor } from '@/lib/units/quantities'
import { useResults, useSessionState } from '@/scene/session/react'
import { useCylinderChoice } from '@/components/figures/cylinder-choice'
import { CycleChart } from '@/components/figures/cycle-chart'
import { BehindFigure } from '@/components/figures/behind'
import { Figures, Note } from '@/components/figures/note'
import { least, most, size } from '@/components/figures/signal'
import { SpeedWords } from '@/components/figures/speed-words'

export function LoadNotes() {
  return (
    <>
      <TurningMoment />
      <RodOnPin />
      <SideThrust />
      <Mains />
    </>
  )
}

function TurningMoment() {
  const { analysis, document } = useResults()
  const system = useSessionState((state) => state.system)
  const { torque, angleDeg } = analysis
  const low = least(torque.totalNm, angleDeg)
  const high = most(torque.totalNm, angleDeg)
  const from = formatQuantity(low.value, 'torque', system)
  const to = formatQuantity(high.value, 'torque', system)
  const gas = document.gas.model !== 'none'
  return (
    <Note title="Turning moment" at="all cylinders">
      <Figures
        rows={[
          { name: 'Mean', figure: formatQuantity(torque.meanNm, 'torque', system), behind: 'torque-mean' },
          {
            name: 'Least to most',
            figure: { text: `${from.text} to ${to.text}`, unit: to.unit },
            behind: { figure: 'torque', angleDeg: high.at },
          },
          {
            name: 'Energy, to and fro',
            figure: formatQuantity(torque.energyFluctuationJ, 'energy', system),
            behind: 'energy-fluctuation',
          },
        ]}
      />
      <CycleChart
        name="Turning moment"
        quantity="torque"
        series={[
          ...(gas ? [{ name: 'gas', look: 'gas' as const, values: torque.gasNm }] : []),
          { name: 'inertia', look: 'inertia', values: torque.inertiaNm },
          { name: 'total', look: 'res', values: torque.totalNm },
        ]}
      />
    </Note>
  )
}

function RodOnPin() {
  const { analysis } = useResults()
  const system = useSessionState((state) => state.system)
  const { cylinder, choice } = useCylinderChoice()
  const load = analysis.loads[cylinder]
  const on = load.crankPinN ?? load.knuckleN!
  const force = size(on.vertical, on.horizontal)
  const peak = most(force, analysis.angleDeg)
  return (
    <Note title={load.crankPinN ? 'Rod on its pin' : 'Link rod on its knuckle'} at={choice}>
      <Figures
        rows={[
          {
            name: `Most, at ${peak.at}°`,
            figure: formatQuantity(peak.value, 'force', system),
            behind: { figure: 'rod-load', cylinder, angleDeg: peak.at },
          },
        ]}
      />
      <CycleChart
        name={`Load of rod ${cylinder} on its pin`}
        quantity="force"
        peak={peak}
        series={[{ name: 'load', look: 'res', values: force }]}
        height={66}
      />
    </Note>
  )
}

function SideThrust() {
  const { analysis } = useResults()
  const system = useSessionState((state) => state.system)
  const { cylinder, choice } = useCylinderChoice()
  const { sideThrustN } = analysis.loads[cylinder]
  const high = most(sideThrustN, analysis.angleDeg)
  const low = least(sideThrustN, analysis.angleDeg)
  const worst = high.value >= -low.value ? high : low
  return (
    <Note title="Side thrust" at={choice}>
      <Figures
        rows={[
          {
            name: `Most, at ${worst.at}°`,
            figure: formatQuantity(Math.abs(worst.value), 'force', system),
            behind: { figure: 'side-thrust', cylinder, angleDeg: worst.at },
          },
        ]}
      />
      <CycleChart
        name={`Side thrust of piston ${cylinder} on its wall`}
        quantity="force"
        peak={worst}
        series={[{ name: 'thrust', look: 'v', values: sideThrustN }]}
        height={66}
      />
    </Note>
  )
}

function Mains() {
  const { analysis, train, document } = useResults()
  const system = useSessionState((state) => state.system)
  const { mainDiaMm, mainLengthMm } = document.shape ?? {}
  const mains = train.mains.filter(({ id }) => analysis.mains[id])
  if (mains.length === 0)
    return (
      <Note title="Mains">
        <p className="say">Fewer than two mains are described: their loads cannot be told.</p>
      </Note>
    )
  const worst = Math.max(...mains.map(({ id }) => analysis.mains[id].peakN))
  return (
    <Note title="Mains, most and mean" at={<SpeedWords />}>
      <table className="otab">
        <thead>
          <tr>
            <th scope="col">Main</th>
            <th scope="col">most, {formatQuantity(worst, 'force', system).unit}</th>
            <th scope="col">mean, {formatQuantity(worst, 'force', system).unit}</th>
          </tr>
        </thead>
        <tbody>
          {mains.map(({ id }) => {
            const { peakN, meanN } = analysis.mains[id]
            const at = (value: number) =>
              formatQuantity(value, 'force', system, undefined, scaleFor(worst, 'force', system)).text
            return (
              <tr key={id}>
                <th scope="row">{id}</th>
                <td>
                  <BehindFigure
                    behind={{ figure: 'main-peak', main: id }}
                    label={`Most on main ${id}, ${at(peakN)}`}
                  >
                    {at(peakN)}
                  </BehindFigure>
                </td>
                <td>
                  <BehindFigure
                    behind={{ figure: 'main-mean', main: id }}
                    label={`Mean on main ${id}, ${at(meanN)}`}
                  >
                    {at(meanN)}
                  </BehindFigure>
                </td>
              </tr>
            )
          })}
        </tbody>
      </table>
      {mainDiaMm && mainLengthMm ? (
        <Figures
          rows={[
            {
              name: 'Most, on its area',
              figure: formatQuantity(worst / ((mainDiaMm / 1000) * (mainLengthMm / 1000)), 'stress', system),
              behind: 'main-specific-load',
            },
          ]}
        />
      ) : null}
      <p className="cap">
        Each load is shared by its two neighbouring mains, as if the crank were hinged at every main.
      </p>
    </Note>
  )
}
