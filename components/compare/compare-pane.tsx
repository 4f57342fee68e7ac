'use client'

import { useEffect, useMemo, useState } from 'react'
import { AngleRule } from '@/components/drawing/angle-rule'
import { StageView } from '@/components/drawing/stage-view'
import { formatNumber, quantityText } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import type { Compared } from '@/scene/model/compare-trains'
import type { Clock } from '@/scene/session/clock'
import { arrowsClipped } from '@/scene/stage/arrows-clipped'
import { cameraOfShot, newtonsPerCm, shotOfCamera, type Shot } from '@/scene/stage/shared-view'
import type { Stage, StageLook, StageModel } from '@/scene/stage/types'
import { useSize } from '@/components/ui/use-size'

interface Props {
  number: number
  compared: Compared
  model: StageModel
  look: StageLook
  shot: Shot
  clock: Clock
  /** Has a clock that no other control of the page runs. */
  apart: boolean
  metresPerNewton: number
  system: System
  onShot(shot: Shot): void
  onSize(size: { width: number; height: number }): void
  onStage(stage: Stage | null): void
}

/** One engine with its crank angle below it, and what a centimetre of arrow stands for. */
export function ComparePane(props: Props) {
  const { number, compared, model, look, shot, clock, apart, metresPerNewton, system, onSize } = props
  const { ref, width, height } = useSize<HTMLDivElement>()
  const { title, cylinders } = compared.document
  useEffect(() => {
    if (width > 0 && height > 0) onSize({ width, height })
  }, [width, height, onSize])
  const scaled = useMemo(() => ({ ...model, metresPerNewton }), [model, metresPerNewton])
  const camera = useMemo(() => cameraOfShot(shot, model.rig), [shot, model.rig])
  const clipped = useMemo(
    () =>
      width > 0 &&
      height > 0 &&
      arrowsClipped(model, look.overlays, camera, { width, height }, metresPerNewton),
    [model, look.overlays, camera, width, height, metresPerNewton],
  )
  // a shorter cycle comes round more than once on the rule of a longer one
  const events = useMemo(() => {
    const { cycle } = model.plan.train
    const rounds = Math.max(1, Math.round(clock.cycle / cycle))
    return Array.from({ length: rounds }, (_, round) =>
      model.events.map((event) => ({
        ...event,
        cylinder: event.cylinder + round * cylinders.length,
        angle: event.angle + round * cycle,
      })),
    ).flat()
  }, [model, clock.cycle, cylinders.length])
  const heading = `${number}. ${title}`
  return (
    <section className="compare-pane" aria-label={heading}>
      <header>
        <h3>{heading}</h3>
        <span className="fig">{formatNumber(compared.speedRpm, { decimals: 0 })} rpm</span>
        {apart ? <RunButton clock={clock} /> : null}
      </header>
      <div className="compare-stage" ref={ref}>
        <StageView
          clock={clock}
          model={scaled}
          look={look}
          camera={camera}
          label={`Engine ${number}, moving drawing`}
          description={`${title}. Arrow keys turn it, plus and minus zoom, brackets step the crank, space runs it.`}
          onCamera={(next) => props.onShot(shotOfCamera(next, model.rig))}
          onStage={props.onStage}
        />
      </div>
      <p className="cap">
        {height > 0
          ? `Forces: ${quantityText(newtonsPerCm(metresPerNewton, camera, height), 'force', system)} per cm. `
          : ''}
        {clipped ? <b>Arrows are clipped at the edge here.</b> : null}
      </p>
      <AngleRule clock={clock} events={events} label={`Crank angle of engine ${number}`} />
    </section>
  )
}

function RunButton({ clock }: { clock: Clock }) {
  const [playing, setPlaying] = useState(clock.playing)
  useEffect(() => {
    const follow = () => setPlaying(clock.playing)
    follow()
    return clock.subscribe(follow)
  }, [clock])
  return (
    <button type="button" className="btn sm" onClick={() => (playing ? clock.pause() : clock.play())}>
      {playing ? 'Pause' : 'Run'}
    </button>
  )
}
