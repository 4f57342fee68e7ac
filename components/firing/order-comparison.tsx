import { BehindFigure } from '@/components/figures/behind'
import { angleWord } from '@/components/figures/interval-words'
import type { RankedOrder } from '@/lib/mechanics/firing-ranking'
import { firingTurns } from '@/lib/mechanics/firing-turns'
import type { Train } from '@/lib/mechanics/train'
import { formatNumber, withUnit } from '@/lib/units/format'
import { fromSi } from '@/lib/units/units'
import { bunched, criteria, intervalsOf, orderName } from './order-words'

interface Props {
  train: Train
  present: RankedOrder
  chosen: RankedOrder
  onTake(): void
  /** The same order, firing at these top dead centres, rad by place in the order. */
  onTurns(angles: readonly number[]): void
}

/** The present order and another over one cycle, and what each is judged by. */
export function OrderComparison({ train, present, chosen, onTake, onTurns }: Props) {
  const same = orderName(train, present) === orderName(train, chosen) && alike(present, chosen)
  const others = firingTurns(train, chosen.order).filter((way) => !alike(way, chosen))
  const both = [
    { head: 'Present', ranked: present },
    { head: 'Chosen', ranked: chosen },
  ]
  return (
    <div className="firing-compare">
      <div className="firing-rows" aria-hidden="true">
        {both.map(({ head, ranked }) => (
          <FiringRow key={head} train={train} head={head} ranked={ranked} />
        ))}
      </div>
      <table className="otab">
        <caption className="vh">The present order and the chosen one</caption>
        <thead>
          <tr>
            <th scope="col" />
            {both.map(({ head }) => (
              <th key={head} scope="col">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          <tr>
            <th scope="row">Order</th>
            {both.map(({ head, ranked }) => (
              <td key={head}>{orderName(train, ranked)}</td>
            ))}
          </tr>
          <tr>
            <th scope="row">Intervals</th>
            {both.map(({ head, ranked }) => (
              <td key={head}>{intervalsOf(ranked)}</td>
            ))}
          </tr>
          {criteria.map(({ id, name, unit, decimals, of }) => (
            <tr key={name}>
              <th scope="row">{name}</th>
              {both.map(({ head, ranked }) => {
                const text = withUnit(formatNumber(of(ranked), { decimals }), unit)
                return (
                  <td key={head}>
                    {ranked === present ? <BehindFigure behind={id}>{text}</BehindFigure> : text}
                  </td>
                )
              })}
            </tr>
          ))}
        </tbody>
      </table>
      {both.map(({ head, ranked }) =>
        bunched(ranked) ? (
          <p key={head} className="cap">
            {head}: {bunched(ranked)}
          </p>
        ) : null,
      )}
      <p className="firing-take">
        <button type="button" className="btn" disabled={same} onClick={onTake}>
          Take {orderName(train, chosen)}
        </button>
        {same ? <span className="cap">This is the present order.</span> : null}
      </p>
      {others.length > 0 ? (
        <div className="firing-ways">
          <p className="cap">
            The order alone leaves open which top dead centres fire; {intervalsOf(chosen)} is taken as the
            most even. It can also fire so:
          </p>
          <p className="firing-take">
            {others.map(({ angles, intervals }) => (
              <button key={intervals.join()} type="button" className="btn sm" onClick={() => onTurns(angles)}>
                {intervals.map((interval) => angleWord(fromSi(interval, '°'))).join('-')}
              </button>
            ))}
          </p>
        </div>
      ) : null}
    </div>
  )
}

interface Fires {
  intervals: number[]
}

const alike = (one: Fires, other: Fires) =>
  one.intervals.every((interval, place) => Math.abs(interval - other.intervals[place]) < 1e-4)

/** Diamonds over one cycle, from the first firing on. */
function FiringRow({ train, head, ranked }: { train: Train; head: string; ranked: RankedOrder }) {
  return (
    <div className="firing-row">
      <span className="cap">{head}</span>
      <div className="firing-line">
        {marksOf(train, ranked).map(({ id, at }, place) => (
          <span
            key={id}
            className="firing-mark fig"
            style={{ left: `${(at / train.cycle) * 100}%` }}
            title={`${angleWord(fromSi(at, '°'))}°, then ${angleWord(fromSi(ranked.intervals[place], '°'))}°`}
          >
            {id}
          </span>
        ))}
      </div>
    </div>
  )
}

function marksOf(train: Train, { order, intervals }: RankedOrder) {
  let angle = 0
  return order.map((cylinder, place) => {
    const at = angle
    angle += intervals[place]
    return { id: train.cylinders[cylinder].id, at }
  })
}
