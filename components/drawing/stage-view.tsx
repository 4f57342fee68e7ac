'use client'

import { useEffect, useEffectEvent, useId, useMemo, useRef } from 'react'
import type { Camera } from '@/scene/frame/types'
import type { Clock } from '@/scene/session/clock'
import { createDetails } from '@/scene/stage/create-details'
import { createStage } from '@/scene/stage/create-stage'
import { cutRig } from '@/scene/stage/cut-rig'
import type {
  CreateDetails,
  NamedView,
  RendererKind,
  Stage,
  StageEvents,
  StageLook,
  StageModel,
} from '@/scene/stage/types'

export interface StageViewProps extends StageEvents {
  clock: Clock
  model: StageModel
  look: StageLook
  /** Section plane across the crank, m, or none. */
  sectionAxial?: number | null
  camera?: Camera | null
  renderer?: RendererKind | 'auto'
  pane?: NamedView
  /** What stands over the drawing besides; another one mounts the stage anew. */
  further?: CreateDetails
  /** Names the drawing for those who do not see it. */
  label: string
  description?: string
  className?: string
  /** Handed the stage once it stands, and null when it has gone. */
  onStage?(stage: Stage | null): void
}

/** React's hand on a stage: mounts it once, passes changes on, and never re-renders for an angle. */
export function StageView(props: StageViewProps) {
  const { clock, look, camera, renderer = 'auto', pane, further, label, description, className } = props
  const { model: whole, sectionAxial = null } = props
  const model = useMemo(
    () => ({
      ...whole,
      rig: cutRig(whole.rig, sectionAxial),
      past: whole.past && { ...whole.past, rig: cutRig(whole.past.rig, sectionAxial) },
    }),
    [whole, sectionAxial],
  )
  const words = useId()
  const host = useRef<HTMLDivElement>(null)
  const stage = useRef<Stage | null>(null)
  const onPick = useEffectEvent<NonNullable<StageEvents['onPick']>>((part, world) =>
    props.onPick?.(part, world),
  )
  const onHover = useEffectEvent((part: string | null) => props.onHover?.(part))
  const onBalloon = useEffectEvent((number: number) => props.onBalloon?.(number))
  const onCamera = useEffectEvent((next: Camera) => props.onCamera?.(next))
  const onRenderer = useEffectEvent((kind: RendererKind, reason: string) => props.onRenderer?.(kind, reason))
  const onTick = useEffectEvent<NonNullable<StageEvents['onTick']>>((instant) => props.onTick?.(instant))
  const onStage = useEffectEvent((next: Stage | null) => props.onStage?.(next))
  const first = useEffectEvent(() => ({ model, look, camera: camera ?? null, renderer }))

  useEffect(() => {
    if (!host.current) return
    const start = first()
    const still = window.matchMedia('(prefers-reduced-motion: reduce)').matches
    const created = createStage(
      host.current,
      clock,
      { onPick, onHover, onBalloon, onCamera, onRenderer, onTick },
      { renderer: start.renderer, pane, motion: !still },
    )
    created.enrich(createDetails)
    if (further) created.enrich(further)
    created.setModel(start.model)
    created.setLook(start.look)
    created.setCamera(start.camera)
    stage.current = created
    onStage(created)
    return () => {
      stage.current = null
      onStage(null)
      created.dispose()
    }
  }, [clock, pane, further])

  useEffect(() => stage.current?.setModel(model), [model])
  useEffect(() => stage.current?.setLook(look), [look])
  useEffect(() => {
    if (camera !== undefined) stage.current?.setCamera(camera)
  }, [camera])
  useEffect(() => stage.current?.setRenderer(renderer), [renderer])

  return (
    <>
      <div
        ref={host}
        className={className}
        style={{ position: 'relative', width: '100%', height: '100%' }}
        role="application"
        aria-roledescription="moving drawing"
        aria-label={label}
        aria-describedby={description ? words : undefined}
        tabIndex={pane ? -1 : 0}
      />
      {description ? (
        <p className="vh" id={words}>
          {description}
        </p>
      ) : null}
    </>
  )
}
