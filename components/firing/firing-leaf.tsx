'use client'

import { BehindFigure } from '@/components/figures/behind'
import { intervalWords } from '@/components/figures/interval-words'
import { Leaf } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import { formatNumber } from '@/lib/units/format'
import { useResults } from '@/scene/session/react'
import { CollectorSections } from './collector-section'
import { OrderSection } from './order-section'
import { PhasingSection } from './phasing-section'

const whole = (value: number) => formatNumber(value, { decimals: 0 })

/** The leaf where the firing order, the throws that allow it and the collectors are chosen. */
export function FiringLeaf() {
  const { analysis, document, train, speedRpm } = useResults()
  const { intervalsDeg, even, alternatesBanks } = analysis.firing
  const banks =
    document.banks.length > 1
      ? alternatesBanks
        ? ' Banks alternate all the way round.'
        : ' Some bank fires twice in a row.'
      : ''
  const intervals = intervalWords(intervalsDeg, even)
  const turns = train.cycle / (2 * Math.PI)
  const perSecond = formatNumber((train.cylinders.length * speedRpm) / 60 / turns, { decimals: 1 })
  return (
    <Leaf
      title="Firing"
      sentence={
        <>
          {document.firingOrder.join('-')} fires {even ? 'evenly' : 'unevenly'},{' '}
          <BehindFigure behind="firing-evenness" label={`Firing intervals, ${intervals} degrees`}>
            {intervals}
          </BehindFigure>{' '}
          degrees apart.{banks} At {whole(speedRpm)} rpm that is {perSecond} a second.
        </>
      }
    >
      <OrderSection />
      <CollectorSections />
      <PhasingSection />
      <Caution />
    </Leaf>
  )
}
