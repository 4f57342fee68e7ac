'use client'

import { useMemo } from 'react'
import { Leaf } from '@/components/figures/leaf'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { useResults } from '@/scene/session/react'
import { BearingSection } from './bearing-section'
import { HarmonicsSection } from './harmonics-section'
import { MethodSection } from './method-section'
import { SweepSection } from './sweep-section'
import { TorsionSection } from './torsion-section'
import { TurningSection } from './turning-section'

/** Loads of the bearings, turning moment, its harmonics, and what grows with speed. */
export function LoadsLeaf() {
  const { train } = useResults()
  // gas and inertia apart: a change of the speed only adds them up anew
  const parts = useMemo(() => cycleParts(train), [train])
  return (
    <Leaf
      title="Loads"
      sentence="What the rods put on their pins and the crank on its mains, what turns the crank, and how it all grows with speed."
    >
      <BearingSection parts={parts} />
      <TurningSection parts={parts} />
      <HarmonicsSection parts={parts} />
      <SweepSection parts={parts} />
      <MethodSection parts={parts} />
      <TorsionSection parts={parts} />
    </Leaf>
  )
}
