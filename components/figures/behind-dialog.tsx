'use client'

import { useMemo } from 'react'
import { Dialog } from '@/components/ui/dialog'
import type { Asked } from '@/lib/mechanics/explain/engine'
import { explain, type FigureId } from '@/lib/mechanics/explain/explain'
import { methodLimits } from '@/lib/mechanics/method'
import { formatNumber, formatQuantity, quantityText, withUnit } from '@/lib/units/format'
import { toSi } from '@/lib/units/units'
import { sizesOf } from '@/scene/model/sizes'
import { useResults, useSessionState } from '@/scene/session/react'
import { Caution } from './caution'

export type AskedBehind = { figure: FigureId } & Omit<Asked, 'speed'>

interface Props {
  asked: AskedBehind
  onClose(): void
}

const figureOf = (value: number) =>
  Number.isInteger(value) && Math.abs(value) < 1e6
    ? formatNumber(value, { decimals: 0 })
    : formatNumber(value, { significant: 6 })

/** Formula, values put in, assumptions, method and source of one figure. */
export function BehindDialog({ asked, onClose }: Props) {
  const { train, document, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const told = useMemo(() => {
    const { figure, sizes, ...rest } = asked
    try {
      return explain(train, figure, {
        ...rest,
        speed: toSi(speedRpm, 'rpm'),
        sizes: { ...sizesOf(document), ...sizes },
      })
    } catch (error) {
      if (error instanceof RangeError) return error.message
      throw error
    }
  }, [asked, train, document, speedRpm])
  const close = (
    <button type="button" className="btn pri" onClick={onClose}>
      Back to the sheet
    </button>
  )
  if (typeof told === 'string')
    return (
      <Dialog title="Behind a figure" about={{ k: 'Figure', v: '–' }} onClose={onClose} actions={close}>
        <p className="read">{told}</p>
      </Dialog>
    )
  const si = toSi(told.value, told.unit)
  const shown = formatQuantity(si, told.quantity, system)
  return (
    <Dialog
      title={`Behind a figure: ${told.title.charAt(0).toLowerCase()}${told.title.slice(1)}`}
      wide
      about={{ k: told.title, v: withUnit(shown.text, shown.unit) }}
      onClose={onClose}
      actions={close}
    >
      <div className="behind-figure">
        <h3>Formula</h3>
        <p className="fig formula">{told.formula}</p>
        <h3>Values put in</h3>
        <p className="fig formula">{told.substituted}</p>
        {system === 'us' && told.unit !== shown.unit ? (
          <p className="cap">The same is {quantityText(si, told.quantity, 'us')}.</p>
        ) : null}
        <table className="otab symbols">
          <thead>
            <tr>
              <th scope="col">Symbol</th>
              <th scope="col">is</th>
              <th scope="col">value</th>
              <th scope="col">unit</th>
            </tr>
          </thead>
          <tbody>
            {told.symbols.map(({ symbol, name, value, unit }) => (
              <tr key={symbol}>
                <th scope="row">{symbol}</th>
                <td className="name">{name}</td>
                <td className="n">{figureOf(value)}</td>
                <td className="un">{unit}</td>
              </tr>
            ))}
          </tbody>
        </table>
        {told.beside ? (
          <p className="say">
            {told.beside.name}:{' '}
            {quantityText(toSi(told.beside.value, told.beside.unit), told.quantity, system)}.
          </p>
        ) : null}
        <h3>Assumes</h3>
        <ul className="assumes">
          {told.assumptions.map((sentence) => (
            <li key={sentence}>{sentence}</li>
          ))}
          <li>{methodLimits}</li>
        </ul>
        <p className="cap">
          Method: {told.method.name}, version {told.method.version}. Source: {told.source}
        </p>
        <Caution />
      </div>
    </Dialog>
  )
}
