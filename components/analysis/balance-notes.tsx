'use client'

import { formatQuantity } from '@/lib/units/format'
import { useResults, useSessionState } from '@/scene/session/react'
import { CycleChart } from '@/components/figures/cycle-chart'
import { verdictSentence } from '@/components/figures/balance-verdict'
import { Figures, Note } from '@/components/figures/note'
import { OrderTable, SenseLegend } from './order-table'
import { most, size } from '@/components/figures/signal'
import { SpeedWords } from '@/components/figures/speed-words'

export function BalanceNotes() {
  const results = useResults()
  const system = useSessionState((state) => state.system)
  const { analysis, bareOrders } = results
  const { shaking, balance, angleDeg } = analysis
  const force = size(shaking.verticalN, shaking.horizontalN)
  const couple = size(shaking.coupleVerticalNm, shaking.coupleHorizontalNm)
  const peak = { force: most(force, angleDeg), couple: most(couple, angleDeg) }
  const { residual, grade } = balance
  return (
    <>
      <Note title="Balance" at={<SpeedWords />}>
        <OrderTable orders={analysis.orders} bare={bareOrders} system={system} />
        <SenseLegend />
        <p className="say">{verdictSentence(results, system)}</p>
      </Note>
      <Note title="Shaking force" at="on the frame">
        <Figures
          rows={[
            {
              name: `Most, at ${peak.force.at}°`,
              figure: formatQuantity(peak.force.value, 'force', system),
              behind: { figure: 'shaking-force', angleDeg: peak.force.at },
            },
          ]}
        />
        <CycleChart
          name="Shaking force"
          quantity="force"
          series={[
            { name: 'vertical', look: 'v', values: shaking.verticalN },
            { name: 'horiz.', look: 'inertia', values: shaking.horizontalN },
          ]}
        />
      </Note>
      <Note title="Shaking couple" at="about mid crank">
        <Figures
          rows={[
            {
              name: `Most, at ${peak.couple.at}°`,
              figure: formatQuantity(peak.couple.value, 'torque', system),
              behind: { figure: 'shaking-couple', angleDeg: peak.couple.at },
            },
          ]}
        />
        <CycleChart
          name="Shaking couple"
          quantity="torque"
          series={[
            { name: 'vertical', look: 'v', values: shaking.coupleVerticalNm },
            { name: 'horiz.', look: 'inertia', values: shaking.coupleHorizontalNm },
          ]}
        />
      </Note>
      <Note title="Residual" at="crank with bob-weights">
        <Figures
          rows={[
            {
              name: 'Static',
              figure: formatQuantity(residual.staticKgMm / 1e3, 'unbalance', system),
              behind: 'residual-static',
            },
            {
              name: 'Couple',
              figure: formatQuantity(residual.coupleKgMm2 / 1e6, 'coupleUnbalance', system),
              behind: 'residual-couple',
            },
            ...(grade
              ? [
                  {
                    name: `Allowed at G ${grade.gradeMmS}`,
                    figure: formatQuantity(grade.permissibleKgMm / 1e3, 'unbalance', system),
                    behind: 'permissible-residual' as const,
                  },
                ]
              : []),
          ]}
        />
        <BobWeights />
      </Note>
    </>
  )
}

function BobWeights() {
  const { analysis } = useResults()
  const system = useSessionState((state) => state.system)
  const weights = Object.entries(analysis.balance.bobWeights)
  const [[, first]] = weights
  const alike = weights.every(([, weight]) => Math.abs(weight.kg - first.kg) < 1e-6)
  return (
    <Figures
      rows={
        alike
          ? [
              {
                name: `Bob-weight, each of ${weights.length}`,
                figure: formatQuantity(first.kg, 'mass', system),
                behind: 'bob-weight',
              },
            ]
          : weights.map(([id, weight]) => ({
              name: `Bob-weight, throw ${id}`,
              figure: formatQuantity(weight.kg, 'mass', system),
              behind: { figure: 'bob-weight', throw: id },
            }))
      }
    />
  )
}
