'use client'

import { verdictSentence } from '@/components/figures/balance-verdict'
import { Leaf } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import { useResults, useSessionState } from '@/scene/session/react'
import { CardSection } from './card-section'
import { ChangeSection } from './change-section'
import { OrderSection } from './order-section'
import { ResidualSection } from './residual-section'
import { ShaftSection } from './shaft-section'
import { WebSection } from './web-section'

/** What shakes and what would take it: counterweights, bob-weights, residual, balance shafts. */
export function BalanceLeaf() {
  const results = useResults()
  const system = useSessionState((state) => state.system)
  return (
    <Leaf title="Balance" sentence={verdictSentence(results, system)}>
      <OrderSection />
      <WebSection />
      <CardSection />
      <div className="balance-column">
        <ResidualSection />
        <ChangeSection />
      </div>
      <ShaftSection />
      <Caution />
    </Leaf>
  )
}
