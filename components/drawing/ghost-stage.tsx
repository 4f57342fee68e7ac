'use client'

import { useMemo } from 'react'
import type { Rig } from '@/scene/frame/types'
import { pastGhost } from '@/scene/stage/past-ghost'
import { StageView, type StageViewProps } from './stage-view'

/**
 * A stage with an older version of the engine over it: thin dash-dot outlines of the parts that differ, at the same
 * crank angle and with the same camera, whichever renderer draws.
 *
 *   <GhostStage {...whatever a StageView takes} older={rig of the older version, or null for none} />
 */
export interface GhostStageProps extends StageViewProps {
  older: Rig | null
}

export function GhostStage({ older, model, ...view }: GhostStageProps) {
  const shown = useMemo(
    () => (older ? { ...model, past: { rig: older, ghost: pastGhost } } : model),
    [model, older],
  )
  return <StageView {...view} model={shown} />
}
