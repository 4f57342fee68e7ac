'use client'

import { useMemo, useState } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { Figures } from '@/components/figures/note'
import { SpeedWords } from '@/components/figures/speed-words'
import { BarChart } from '@/components/ui/charts/bar-chart'
import { StarChart } from '@/components/ui/charts/star-chart'
import { Segmented } from '@/components/ui/segmented'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { loadParts, type LoadPart } from '@/lib/mechanics/loads/part-signals'
import { orderStar, torqueOrders } from '@/lib/mechanics/loads/torque-orders'
import { torqueSignal } from '@/lib/mechanics/loads/turning-moment'
import { formatNumber, formatQuantity, quantityText } from '@/lib/units/format'
import { toSi } from '@/lib/units/units'
import { useResults, useSessionState } from '@/scene/session/react'
import { DEGREES, quantityAxis } from '@/components/figures/axis'
import { orderText } from './order-text'

/** Torque by orders, and how the cylinders stand to each other at one of them. */
export function HarmonicsSection({ parts }: { parts: CycleParts }) {
  const { document, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const gas = document.gas.model !== 'none'
  const [part, setPart] = useState<LoadPart>('total')
  const [chosenOrder, setChosenOrder] = useState<number | null>(null)
  const shownPart = gas ? part : 'inertia'
  const speed = toSi(speedRpm, 'rpm')
  const { train, plan } = parts
  const orders = useMemo(
    () =>
      torqueOrders(torqueSignal(parts, shownPart, speed), train.cycle).map((one) => ({
        ...one,
        major: orderStar(plan.fires, one.order).major,
      })),
    [parts, shownPart, speed, train, plan],
  )
  const many = train.cylinders.length > 1
  const strongest = orders.reduce((best, one) => (one.amplitude > best.amplitude ? one : best))
  const chosen = Math.max(
    0,
    orders.findIndex(({ order }) => order === (chosenOrder ?? strongest.order)),
  )
  const axis = quantityAxis('Amplitude', 'torque', strongest.amplitude, system)
  const x = useMemo(() => ({ name: 'Order, per crank turn', unit: '', format: orderText }), [])
  const majors = orders.filter(({ major }) => major).map(({ order }) => orderText(order))
  return (
    <LeafSection title="Harmonics" at={<SpeedWords />} wide>
      <div className="loads-tools">
        {gas ? (
          <Segmented
            label="Moment of"
            value={part}
            options={loadParts.map((value) => ({ value, label: value }))}
            onChange={setPart}
          />
        ) : null}
        <label className="pick-label">
          order{' '}
          <select
            className="pick"
            value={orders[chosen].order}
            onChange={(event) => setChosenOrder(Number(event.target.value))}
          >
            {orders.map(({ order, major }) => (
              <option key={order} value={order}>
                {orderText(order)}
                {many && major ? ', major' : ''}
              </option>
            ))}
          </select>
        </label>
      </div>
      <div className="loads-pair wide-first">
        <BarChart
          title={`Turning moment by order, ${shownPart}`}
          sentence={`The strongest order is ${orderText(strongest.order)} with ${quantityText(strongest.amplitude, 'torque', system)}. ${majorWords(majors, many)}`}
          x={x}
          y={axis}
          bars={orders.map(({ order, amplitude, major }) => ({
            x: order,
            y: axis.shown(amplitude),
            mark: many && major ? 'major order' : undefined,
          }))}
          chosen={chosen}
          onChoose={(index) => setChosenOrder(orders[index].order)}
        />
        <Star parts={parts} part={shownPart} order={orders[chosen].order} />
      </div>
      <Figures
        rows={[
          {
            name: `Amplitude at order ${orderText(orders[chosen].order)}, ${shownPart}`,
            figure: formatQuantity(orders[chosen].amplitude, 'torque', system),
            // gas and inertia apart are not explained by themselves; without gas, inertia is all there is
            behind:
              shownPart === 'total' || !gas
                ? { figure: 'torque-order', order: orders[chosen].order }
                : undefined,
          },
          {
            name: 'Vector sum, all alike',
            figure: {
              text: formatNumber(sumOf(plan.fires, orders[chosen].order), { decimals: 2 }),
              unit: '',
            },
            behind: { figure: 'order-vector-sum', order: orders[chosen].order },
          },
        ]}
      />
      <p className="cap">
        A diamond marks a major order: the cylinders’ vectors are all within 20° of their sum. Amplitude and
        phase are of moment = amplitude × cos(order × crank angle − phase).
      </p>
    </LeafSection>
  )
}

function sumOf(fires: ArrayLike<number>, order: number): number {
  const { sum } = orderStar(fires, order)
  return Math.hypot(sum.re, sum.im)
}

function majorWords(majors: string[], many: boolean): string {
  if (!many) return 'One cylinder is always in phase with itself.'
  if (majors.length === 0) return 'At no order are all cylinders in phase.'
  return `All cylinders are in phase at ${majors.length === 1 ? 'order' : 'orders'} ${majors.join(', ')}.`
}

interface StarProps {
  parts: CycleParts
  part: LoadPart
  order: number
}

function Star({ parts, part, order }: StarProps) {
  const { speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const [by, setBy] = useState<'phase' | 'moment'>('phase')
  const { train, plan } = parts
  const speed = toSi(speedRpm, 'rpm')
  const star = useMemo(() => {
    if (by === 'phase') return orderStar(plan.fires, order)
    // each cylinder's own wave: its phase takes the place of order × firing angle
    const own = train.cylinders.map((_, i) =>
      torqueOrders(torqueSignal(parts, part, speed, [i]), train.cycle).find((one) => one.order === order)!,
    )
    return orderStar(
      own.map(({ phase }) => phase),
      1,
      own.map(({ amplitude }) => amplitude),
    )
  }, [by, parts, part, speed, order, plan, train])
  const count = train.cylinders.length
  const sum = Math.hypot(star.sum.re, star.sum.im)
  const angleOf = ({ re, im }: { re: number; im: number }) => (Math.atan2(im, re) * DEGREES + 360) % 360
  const axis =
    by === 'phase'
      ? {
          name: 'Length',
          unit: '',
          format: (value: number) => formatNumber(value, { decimals: 2 }),
          shown: (v: number) => v,
        }
      : quantityAxis('Amplitude', 'torque', sum / count, system)
  const sumText =
    by === 'phase' ? `${formatNumber(sum, { decimals: 2 })} of ${count}` : quantityText(sum, 'torque', system)
  return (
    <div className="loads-star">
      <Segmented
        label="Length of a vector"
        value={by}
        options={[
          { value: 'phase', label: 'All alike' },
          { value: 'moment', label: 'By moment' },
        ]}
        onChange={setBy}
      />
      <StarChart
        title={`Cylinders at order ${orderText(order)}`}
        sentence={`At order ${orderText(order)} the vectors of ${count === 1 ? 'the one cylinder' : `${count} cylinders`} add up to ${sumText}${star.major && count > 1 ? ': all in phase' : ''}.${count > 1 ? ` The double line is that sum ÷ ${count}.` : ''}`}
        size={axis}
        arrows={train.cylinders.map(({ id }, i) => ({
          name: id,
          length: axis.shown(Math.hypot(star.vectors[i].re, star.vectors[i].im)),
          angleDeg: angleOf(star.vectors[i]),
        }))}
        sum={{ length: axis.shown(sum / count), angleDeg: angleOf(star.sum) }}
      />
    </div>
  )
}
