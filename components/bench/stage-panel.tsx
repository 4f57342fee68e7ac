'use client'

import dynamic from 'next/dynamic'
import { useEffect, useMemo, useRef, useState } from 'react'
import { viewOptions } from '@/components/drawing/view-names'
import { onThemeChange } from '@/components/shell/theme'
import { Segmented } from '@/components/ui/segmented'
import { formatNumber } from '@/lib/units/format'
import { cameraOf, sceneCameraOf } from '@/scene/frame/scene-camera'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import type { NamedView, RendererKind, Stage, StageLook } from '@/scene/stage/types'
import { balloonsOf, partsOfRow, rowOfBalloon, rowOfPart } from './balloons'
import { LiveWords } from './live-words'
import { focusRow } from './parts-list'
import { PickedPart } from './picked-part'
import { ShowPanel } from './show-panel'
import { useReducedMotion } from '@/components/drawing/use-reduced-motion'

// The drawing needs a browser: it is fetched once the page stands.
const StageView = dynamic(
  () => import('@/components/drawing/stage-view').then((module) => module.StageView),
  {
    ssr: false,
    loading: () => <p className="setting-out">Setting out the drawing</p>,
  },
)

/** From this width on, end and side view stand beside the free one. */
const ROOM_FOR_PANES = 980

interface Props {
  id: string
  onRenderer(kind: RendererKind, reason: string): void
}

export function StagePanel({ id, onRenderer }: Props) {
  const { session, clock } = useBench()
  const { model, speedRpm, document: train } = useResults()
  const view = useSessionState((state) => state.scene.view)
  const system = useSessionState((state) => state.system)
  const picked = useSessionState((state) => state.picked)
  const lit = useSessionState((state) => state.lit)
  const pointed = useSessionState((state) => state.pointed)
  const refused = useSessionState((state) => state.refused)
  const scene = useSessionState((state) => state.scene)
  const stages = useRef(new Set<Stage>())
  const main = useRef<Stage | null>(null)
  const [name, setName] = useState<NamedView>('free')
  const [renderer, setRenderer] = useState<RendererKind | 'auto'>('auto')
  const [wide, setWide] = useState(false)
  const [panes, setPanes] = useState<boolean | null>(null)
  const host = useRef<HTMLElement>(null)
  const still = useReducedMotion()
  const showPanes = panes ?? wide

  useEffect(() => onThemeChange(() => stages.current.forEach((stage) => stage.retheme())), [])
  useEffect(() => {
    const observer = new ResizeObserver(([entry]) => setWide(entry.contentRect.width >= ROOM_FOR_PANES))
    observer.observe(host.current!)
    return () => observer.disconnect()
  }, [])

  const sectionAxial = view.sectionAxialMm === null ? null : view.sectionAxialMm / 1000
  const look = useMemo<StageLook>(() => {
    const row = lit ? partsOfRow(model.rig, scene, lit) : []
    return {
      hidden: view.hidden,
      ghost: view.ghost,
      overlays: view.overlays,
      lit: [...(picked ? [picked] : pointed), ...row],
      balloons: view.overlays.labels ? balloonsOf(model.rig, scene, lit, new Set(Object.keys(refused))) : [],
      forceUnit: system === 'us' ? 'lbf' : 'N',
    }
  }, [view.hidden, view.ghost, view.overlays, picked, pointed, lit, refused, model.rig, scene, system])

  // The stage moves its own camera; it is told one only when another document is opened.
  const base = useSessionState((state) => state.base)
  const [given, setGiven] = useState(() => ({ base, camera: view.camera && cameraOf(view.camera) }))
  if (given.base !== base) setGiven({ base, camera: view.camera && cameraOf(view.camera) })

  const keep = (stage: Stage | null, isMain: boolean) => {
    if (isMain) main.current = stage
    if (stage) stages.current.add(stage)
  }
  const describe = `${train.title}, ${train.cylinders.length} cylinders. Arrow keys turn it, plus and minus zoom, Home frames it, brackets step the crank, space runs it, 1 to 6 are the named views.`
  const over = train.operating?.maxRpm
  return (
    <section className="stage" id={id} aria-label="Drawing" ref={host}>
      <div className="stage-head">
        <Segmented
          label="Named views"
          value={name}
          options={viewOptions}
          onChange={(next) => {
            setName(next)
            main.current?.view(next)
          }}
        />
        <span className="grow" />
        <ShowPanel renderer={renderer} onRenderer={setRenderer} panes={showPanes} onPanes={setPanes} />
      </div>
      {over && speedRpm > over ? (
        <p className="over-speed" role="status">
          <b>Over speed.</b> {formatNumber(speedRpm, { decimals: 0 })} rpm is above the most,{' '}
          {formatNumber(over, { decimals: 0 })}: a study on paper only. Forces grow with the square of the
          speed.
        </p>
      ) : null}
      <div className={showPanes ? 'stage-body with-panes' : 'stage-body'}>
        <div className="stage-main">
          <StageView
            clock={clock}
            model={model}
            look={look}
            sectionAxial={sectionAxial}
            camera={given.camera}
            renderer={renderer}
            label="Crank train, moving drawing"
            description={describe}
            onStage={(stage: Stage | null) => keep(stage, true)}
            onPick={(part: string | null) => {
              session.pick(part)
              session.light(null)
            }}
            onHover={(part: string | null) => session.light(part ? rowOfPart(model.rig, scene, part) : null)}
            onBalloon={(number: number) => {
              const key = rowOfBalloon(scene, number)
              if (key) focusRow(key)
            }}
            onCamera={(next) => session.edit([{ path: ['view', 'camera'], value: sceneCameraOf(next) }])}
            onRenderer={onRenderer}
          />
        </div>
        {showPanes ? (
          <div className="stage-panes">
            {(['end', 'side'] as const).map((pane) => (
              <figure key={pane} className="stage-pane">
                <StageView
                  clock={clock}
                  model={model}
                  look={look}
                  sectionAxial={sectionAxial}
                  renderer={renderer}
                  pane={pane}
                  label={pane === 'end' ? 'End view' : 'Side view'}
                  onStage={(stage: Stage | null) => keep(stage, false)}
                />
                <figcaption className="cap">{pane === 'end' ? 'End view' : 'Side view'}</figcaption>
              </figure>
            ))}
          </div>
        ) : null}
      </div>
      <PickedPart />
      <LiveWords still={still} />
    </section>
  )
}
