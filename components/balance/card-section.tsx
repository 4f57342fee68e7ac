'use client'

import { useMemo, useState } from 'react'
import { flushSync } from 'react-dom'
import { BehindFigure } from '@/components/figures/behind'
import { LeafSection } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import {
  bobWeightCards,
  factorOfAll,
  factorOfOne,
  type BobWeightCard,
  type CardPart,
} from '@/lib/mechanics/balance/bob-weight-card'
import { plainNumber, quantityText } from '@/lib/units/format'
import { pistonParts } from '@/scene/model/piston-parts'
import { plainField } from '@/scene/session/plain-field'
import { factorSlip, percentSlip } from '@/scene/session/usual'
import { quantityField } from '@/scene/session/field'
import { useResults, useSessionState } from '@/scene/session/react'
import { DocumentField } from '@/components/figures/document-field'

const ofAll = plainField(['balanceFactor'], 'Of all reciprocating mass on the pin', 'share', '', {
  doubt: factorSlip,
})

/** The same factor as a share of one cylinder's reciprocating mass, where `rods` share a pin. */
const ofOne = (rods: number) =>
  quantityField({
    key: 'balanceFactor.ofOne',
    label: 'Of one cylinder’s reciprocating mass',
    quantity: 'share',
    documentUnit: '',
    get: ({ train }) => factorOfOne(train.balanceFactor, rods),
    changes: (value = 0) => [{ path: ['train', 'balanceFactor'], value: factorOfAll(value, rods) }],
    doubt: percentSlip,
  })

/** What to hang on each throw on the balancing machine; prints by itself. */
export function CardSection() {
  const { document, train } = useResults()
  const [chosen, setChosen] = useState(train.throws[0].id)
  const [printing, setPrinting] = useState(false)
  const cards = useMemo(() => bobWeightCards(train, pistonParts(document)), [document, train])
  const alike = cards.every((card) => sameWeights(card, cards[0]))
  const card = cards.find((one) => one.throw === chosen) ?? cards[0]
  const print = () => {
    flushSync(() => setPrinting(true))
    window.print()
    setPrinting(false)
  }
  const rods = train.cylinders.filter((cylinder) => train.throws[cylinder.throw].id === card.throw).length
  return (
    <div className={printing ? 'bob-card printing' : 'bob-card'}>
      <LeafSection
        title="Bob-weight card"
        at={alike ? `the same on each of ${cards.length} throws` : `throw ${card.throw}`}
      >
        {alike ? null : (
          <label className="pick-label">
            throw{' '}
            <select className="pick" value={card.throw} onChange={(event) => setChosen(event.target.value)}>
              {cards.map((one) => (
                <option key={one.throw}>{one.throw}</option>
              ))}
            </select>
          </label>
        )}
        <p className="print-only">{document.title}</p>
        <CardTable card={card} />
        <div className="card-factors">
          <DocumentField field={ofAll} />
          {rods > 1 ? <DocumentField field={ofOne(rods)} /> : null}
        </div>
        <p className="cap">
          <FactorWords factor={document.balanceFactor} rods={rods} pin={card.throw} />
        </p>
        <Caution />
        <button type="button" className="btn sm card-print" onClick={print}>
          Print the card
        </button>
      </LeafSection>
    </div>
  )
}

function FactorWords({ factor, rods, pin }: { factor: number; rods: number; pin: string }) {
  const percent = (value: number) => `${plainNumber(100 * value)} %`
  const quoted = (
    <BehindFigure
      behind={{ figure: 'balance-factor', throw: pin }}
      label={`Balance factor, ${percent(factor)}`}
    >
      {percent(factor)}
    </BehindFigure>
  )
  return rods < 2 ? (
    <>One rod on the pin: both ways of quoting a balance factor are the same here, {quoted}.</>
  ) : (
    <>
      Two ways of quoting one weight: {quoted} of all {rods} cylinders on the pin is{' '}
      {percent(factorOfOne(factor, rods))} of one.
    </>
  )
}

const sameWeights = (a: BobWeightCard, b: BobWeightCard) =>
  a.rows.length === b.rows.length &&
  a.rows.every(
    (row, i) => Math.abs(row.total - b.rows[i].total) < 1e-8 && row.quantity === b.rows[i].quantity,
  )

const partWords: Record<CardPart, string> = {
  piston: 'Piston',
  pin: 'Piston pin',
  locks: 'Pin locks',
  rings: 'Ring set',
  'small end': 'Rod, small end',
  'big end': 'Rod, big end',
  shells: 'Bearing shells',
  oil: 'Oil',
}

function CardTable({ card }: { card: BobWeightCard }) {
  const system = useSessionState((state) => state.system)
  const mass = (kg: number) => quantityText(kg, 'mass', system)
  const sections = [
    { title: 'Reciprocating', moves: 'reciprocating', sum: card.reciprocating },
    { title: 'Rotating, with oil', moves: 'rotating', sum: card.rotating + card.oil },
  ] as const
  return (
    <table className="tab card-table">
      <caption className="vh">Bob-weight card, throw {card.throw}</caption>
      <thead>
        <tr>
          <th scope="col">Part</th>
          <th scope="col" className="r">
            Quantity
          </th>
          <th scope="col" className="r">
            Each
          </th>
          <th scope="col" className="r">
            Together
          </th>
        </tr>
      </thead>
      {sections.map(({ title, moves, sum }) => (
        <tbody key={moves}>
          {card.rows
            .filter((row) => row.moves === moves)
            .map(({ part, quantity, each, total, cylinders }) => (
              <tr key={`${part} ${cylinders.join()}`}>
                <th scope="row">
                  {partWords[part]}
                  {card.rows.filter((row) => row.part === part).length > 1 ? (
                    <span className="u"> cylinder {cylinders.join(', ')}</span>
                  ) : null}
                </th>
                <td className="n">{quantity}</td>
                <td className="n">{mass(each)}</td>
                <td className="n">{mass(total)}</td>
              </tr>
            ))}
          <tr className="sum">
            <th scope="row" colSpan={3}>
              {title}
            </th>
            <td className="n">{mass(sum)}</td>
          </tr>
        </tbody>
      ))}
      <tfoot>
        <tr>
          <th scope="row" colSpan={3}>
            Balance factor × reciprocating
          </th>
          <td className="n">{mass(card.factor.ofAll * card.reciprocating)}</td>
        </tr>
        <tr className="sum">
          <th scope="row" colSpan={3}>
            Bob-weight
          </th>
          <td className="n">
            <BehindFigure
              behind={{ figure: 'bob-weight', throw: card.throw }}
              label={`Bob-weight, ${mass(card.total)}`}
            >
              {mass(card.total)}
            </BehindFigure>
          </td>
        </tr>
      </tfoot>
    </table>
  )
}
