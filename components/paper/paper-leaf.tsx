'use client'

import { useMemo, useState } from 'react'
import { Leaf } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/caution'
import { snapshot } from '@/scene/session/draft'
import { useBench, useSessionState } from '@/scene/session/react'
import { DesignSheetSection } from './design-sheet-section'
import { FiguresSection } from './figures-section'
import { ModelSection } from './model-section'

/** The leaf where the work leaves the bench: design sheet, model, picture, figures. */
export function PaperLeaf() {
  const { session, clock } = useBench()
  const now = useSessionState((state) => state.scene)
  const [angleDeg, setAngleDeg] = useState(() => snapshot(session, clock).view.angleDeg)
  const scene = useMemo(() => ({ ...now, view: { ...now.view, angleDeg, playing: false } }), [now, angleDeg])
  return (
    <Leaf
      title="Paper"
      sentence="What can be taken away from the bench: the design sheet to print, the model for other programs, the picture, and every figure as a table."
    >
      <DesignSheetSection
        scene={scene}
        onTakeAngle={() => setAngleDeg(snapshot(session, clock).view.angleDeg)}
      />
      <ModelSection />
      <FiguresSection />
      <Caution />
    </Leaf>
  )
}
