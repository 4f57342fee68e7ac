'use client'

import { useMemo, useState } from 'react'
import { useSize } from '@/components/ui/use-size'
import { directionOf } from '@/scene/frame/camera'
import type { Clock } from '@/scene/session/clock'
import { cameraOfShot, commonScale, shotOf, shotOfCamera, type Shot } from '@/scene/stage/shared-view'
import type { NamedView, Stage, StageLook, StageModel } from '@/scene/stage/types'
import { StageView } from './stage-view'

/**
 * Two versions beside each other, or one over the other where there is no room: one clock, so exactly one crank angle,
 * one camera and one scale of force. Fills its box.
 *
 *   <PairStage clock look view="free" sides={[{ model, title: 'Version 3' }, { model, title: 'Version 4' }]} />
 */
export interface PairStageProps {
  clock: Clock
  look: StageLook
  /** Where both are looked at from until a hand turns them; another name turns them back. */
  view: NamedView
  sides: readonly [PairSide, PairSide]
  onPick?(part: string | null): void
  onStage?(side: 0 | 1, stage: Stage | null): void
}

export interface PairSide {
  model: StageModel
  title: string
}

export function PairStage({ clock, look, view, sides, onPick, onStage }: PairStageProps) {
  const { ref, width, height } = useSize<HTMLDivElement>()
  const [moved, setMoved] = useState<{ view: NamedView; shot: Shot } | null>(null)
  const wide = width >= height
  const sheet = wide ? { width: width / 2, height } : { width, height: height / 2 }
  const aspect = sheet.height > 0 ? sheet.width / sheet.height : 1
  const [older, newer] = [sides[0].model, sides[1].model]
  const framed = useMemo(
    () => shotOf([older.rig, newer.rig], aspect, directionOf(view, newer.rig)),
    [older, newer, aspect, view],
  )
  const shot = moved?.view === view ? moved.shot : framed
  const models = useMemo(() => {
    const metresPerNewton = commonScale([older, newer])
    return [older, newer].map((model) => ({ ...model, metresPerNewton }))
  }, [older, newer])
  const cameras = useMemo(
    () => [cameraOfShot(shot, older.rig), cameraOfShot(shot, newer.rig)],
    [shot, older, newer],
  )
  return (
    <div ref={ref} className={wide ? 'pair-stage' : 'pair-stage is-tall'}>
      {sides.map(({ title }, i) => (
        <section key={i} aria-label={title}>
          <h3>{title}</h3>
          <StageView
            clock={clock}
            model={models[i]}
            look={look}
            camera={cameras[i]}
            label={`${title}, moving drawing`}
            description="Arrow keys turn both, plus and minus zoom, brackets step the crank, space runs it."
            onCamera={(next) => setMoved({ view, shot: shotOfCamera(next, models[i].rig) })}
            onPick={onPick}
            onStage={(stage) => onStage?.(i === 0 ? 0 : 1, stage)}
          />
        </section>
      ))}
    </div>
  )
}
