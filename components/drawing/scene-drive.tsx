'use client'

import { useEffect, useMemo } from 'react'
import { onThemeChange } from '@/components/shell/theme'
import type { Train } from '@/lib/mechanics/train'
import type { Scene } from '@/scene/model/scene'
import { buildForces } from '@/scene/stage/build-forces'
import { createDetails } from '@/scene/stage/create-details'
import { FiringStrip } from './firing-strip'
import { PlayButtons } from './play-buttons'
import type { MovingScene } from './start-scene'

const rpm = (2 * Math.PI) / 60

interface Props {
  scene: Scene
  train: Train
  moving: MovingScene
}

/** The second step of a scene that moves: its forces, marks and hands, and the drive under it. */
export default function SceneDrive({ scene: { train: document, view }, train, moving }: Props) {
  const { clock, stage, rig } = moving
  const forces = useMemo(() => buildForces(train, view.speedRpm * rpm), [train, view.speedRpm])
  useEffect(() => {
    stage.enrich(createDetails)
    stage.setModel({ rig, ...forces })
  }, [stage, rig, forces])
  useEffect(() => onThemeChange(() => stage.retheme()), [stage])
  return (
    <div className="live-drive">
      <PlayButtons clock={clock} />
      <span className="cap pace">
        {view.slowdown > 1 ? `Shown at 1 : ${Math.round(view.slowdown)}` : 'Shown at full speed'}
      </span>
      <FiringStrip clock={clock} train={document} forces={forces} />
    </div>
  )
}
