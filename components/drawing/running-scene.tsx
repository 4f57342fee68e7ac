'use client'

import { useEffect, useEffectEvent, useMemo, useRef, useState } from 'react'
import { Icon } from '@/components/ui/icon'
import { cameraOf } from '@/scene/frame/scene-camera'
import type { Scene } from '@/scene/model/scene'
import { toTrain } from '@/scene/model/to-train'
import { createClock, type Clock } from '@/scene/session/clock'
import { buildStageModel } from '@/scene/stage/build-stage-model'
import type { StageLook, StageModel } from '@/scene/stage/types'
import { AngleRule } from './angle-rule'
import { StageView } from './stage-view'

const radians = Math.PI / 180
const rpm = (2 * Math.PI) / 60

/** A clock that stands where the scene was saved, and runs as it ran, unless motion is not wanted. */
function clockOf(view: Scene['view'], cycle: number): Clock {
  const clock = createClock(cycle)
  clock.setAngle(view.angleDeg * radians)
  clock.setRate((view.speedRpm * rpm) / view.slowdown)
  clock.setReverse(view.reverse)
  if (view.playing && !window.matchMedia('(prefers-reduced-motion: reduce)').matches) clock.play()
  return clock
}

function lookOf(view: Scene['view']): StageLook {
  return {
    hidden: view.hidden,
    ghost: view.ghost,
    sectionAxial: view.sectionAxialMm === null ? null : view.sectionAxialMm / 1000,
    overlays: view.overlays,
    lit: [],
    balloons: [],
    forceUnit: 'N',
  }
}

interface Props {
  scene: Scene
  label: string
  description: string
  onRunning(): void
}

export function RunningScene({ scene, label, description, onRunning }: Props) {
  const { train: document, view } = scene
  const train = useMemo(() => toTrain(document), [document])
  const model = useMemo(
    () => buildStageModel(document, train, view.speedRpm * rpm),
    [document, train, view.speedRpm],
  )
  const [clock] = useState(() => clockOf(view, train.cycle))
  const look = useMemo(() => lookOf(view), [view])
  const camera = useMemo(() => (view.camera ? cameraOf(view.camera) : null), [view])
  const seen = useRef(false)
  return (
    <>
      <StageView
        className="stage-host"
        clock={clock}
        model={model}
        look={look}
        camera={camera}
        label={label}
        description={description}
        onTick={() => {
          if (seen.current) return
          seen.current = true
          onRunning()
        }}
      />
      <Drive clock={clock} model={model} slowdown={view.slowdown} />
    </>
  )
}

function Drive({ clock, model, slowdown }: { clock: Clock; model: StageModel; slowdown: number }) {
  const [playing, setPlaying] = useState(clock.playing)
  const follow = useEffectEvent(() => setPlaying(clock.playing))
  useEffect(() => clock.subscribe(follow), [clock])
  const step = (degrees: number) => {
    clock.pause()
    clock.setAngle(clock.angle + degrees * radians)
  }
  return (
    <div className="live-drive">
      <div className="btns">
        <button
          type="button"
          className="btn pri ic"
          aria-label={playing ? 'Pause' : 'Play'}
          onClick={() => (playing ? clock.pause() : clock.play())}
        >
          <Icon name={playing ? 'pause' : 'play'} />
        </button>
        <button type="button" className="btn ic" aria-label="Back 1 degree" onClick={() => step(-1)}>
          <Icon name="back" />
        </button>
        <button type="button" className="btn ic" aria-label="On 1 degree" onClick={() => step(1)}>
          <Icon name="on" />
        </button>
      </div>
      <AngleRule clock={clock} events={model.events} />
      <span className="cap pace">
        {slowdown > 1 ? `Shown at 1 : ${Math.round(slowdown)}` : 'Shown at full speed'}
      </span>
    </div>
  )
}
