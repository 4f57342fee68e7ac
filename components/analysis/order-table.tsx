import { BehindFigure } from '@/components/figures/behind'
import { formatNumber } from '@/lib/units/format'
import { scaleFor, type Scale, type System } from '@/lib/units/quantities'
import { fromSi } from '@/lib/units/units'
import type { Results } from '@/scene/session/results'

type Order = Results['bareOrders'][number]

const sense = {
  forward: (
    <svg className="g" viewBox="0 0 14 14" aria-hidden="true">
      <path d="M2.4 9.6A5 5 0 1 1 11.6 9.2" />
      <path className="h" d="M13.6 7.6 11 12.4 8.8 7.9z" />
    </svg>
  ),
  backward: (
    <svg className="g back" viewBox="0 0 14 14" aria-hidden="true">
      <path d="M11.6 9.6A5 5 0 1 0 2.4 9.2" />
      <path className="h" d="M.4 7.6 3 12.4 5.2 7.9z" />
    </svg>
  ),
}

const columns = ['forwardN', 'backwardN', 'forwardNm', 'backwardNm'] as const
const behindOf = {
  forwardN: 'order-forward',
  backwardN: 'order-backward',
  forwardNm: 'order-couple-forward',
  backwardNm: 'order-couple-backward',
} as const
const wordsOf = {
  forwardN: 'force forward',
  backwardN: 'force backward',
  forwardNm: 'couple forward',
  backwardNm: 'couple backward',
}
const decimalsFor = (most: number, scale: Scale) => {
  const shown = fromSi(most, scale.unit)
  return shown >= 1000 ? 0 : shown >= 100 ? 1 : 2
}

/** First, second and fourth order by the sense in which they turn, with the bare crank's first for comparison. */
export function OrderTable({ orders, bare, system }: { orders: Order[]; bare: Order[]; system: System }) {
  const at = (list: Order[], order: number) => list.find((one) => one.order === order)
  const rows = [
    { name: '1, bare', sub: true, order: at(bare, 1) },
    ...[1, 2, 4].map((order) => ({ name: String(order), sub: false, order: at(orders, order) })),
  ].flatMap(({ name, sub, order }) => (order ? [{ name, sub, order }] : []))
  const peak = (keys: readonly (typeof columns)[number][]) =>
    Math.max(...rows.flatMap(({ order }) => keys.map((key) => order[key])))
  const force = {
    most: peak(['forwardN', 'backwardN']),
    scale: scaleFor(peak(['forwardN', 'backwardN']), 'force', system),
  }
  const coupleMost = peak(['forwardNm', 'backwardNm'])
  const couple = { most: coupleMost, scale: scaleFor(coupleMost, 'torque', system) }
  const cell = (value: number, { most, scale }: { most: number; scale: Scale }) => {
    const text = formatNumber(fromSi(value, scale.unit), { decimals: decimalsFor(most, scale) })
    return /[1-9]/.test(text) ? text : <span className="zero">{text}</span>
  }
  return (
    <table className="otab">
      <thead>
        <tr>
          <th rowSpan={2} scope="col">
            Order
          </th>
          <th colSpan={2} scope="colgroup">
            force, {force.scale.unit}
          </th>
          <th colSpan={2} scope="colgroup">
            couple, {couple.scale.unit}
          </th>
        </tr>
        <tr>
          {(['forward', 'backward', 'forward', 'backward'] as const).map((name, i) => (
            <th key={`${name}${i}`} scope="col">
              {sense[name]}
              <span className="vh">{name}</span>
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map(({ name, sub, order }) => (
          <tr key={name} className={sub ? 'sub' : undefined}>
            <th scope="row">{name}</th>
            {columns.map((key) => (
              <td key={key}>
                <BehindFigure
                  behind={{ figure: behindOf[key], order: order.order, bare: sub }}
                  label={`Order ${name}, ${wordsOf[key]}`}
                >
                  {cell(order[key], key.endsWith('Nm') ? couple : force)}
                </BehindFigure>
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  )
}

export const SenseLegend = () => (
  <p className="cap sense">
    {sense.forward} turns with the crank &nbsp; {sense.backward} turns against it
  </p>
)
