'use client'

import dynamic from 'next/dynamic'
import { useEffect, useMemo, useRef, useState, type ReactNode } from 'react'
import { LiveAngle } from '@/components/drawing/live-angle'
import type { Drawing } from '@/components/drawing/use-drawing'
import { viewOptions } from '@/components/drawing/view-names'
import { noteKeys } from '@/components/notes/note-keys'
import { NoteMarks } from '@/components/notes/note-marks'
import type { NoteDesk } from '@/components/notes/use-note-desk'
import { onThemeChange } from '@/components/shell/theme'
import { Segmented } from '@/components/ui/segmented'
import type { Comparison } from '@/components/versions/use-comparison'
import { cameraOf } from '@/scene/frame/scene-camera'
import type { NamedView, RendererKind, Stage, StageLook } from '@/scene/stage/types'

// The drawing needs a browser: it is fetched once the page stands.
const settingOut = () => <p className="setting-out">Setting out the drawing</p>
const GhostStage = dynamic(
  () => import('@/components/drawing/ghost-stage').then((module) => module.GhostStage),
  { ssr: false, loading: settingOut },
)
const PairStage = dynamic(
  () => import('@/components/drawing/pair-stage').then((module) => module.PairStage),
  { ssr: false, loading: settingOut },
)

interface Props {
  drawing: Drawing
  version: number
  /** Parts that are lit, by their ids. */
  lit: readonly string[]
  /** The version it is compared with, drawn over it or beside it. */
  comparison: Comparison
  desk: NoteDesk
  /** What has been said of the version, on its drawing. */
  stamp: ReactNode
  onStage(stage: Stage | null): void
  onRenderer(kind: RendererKind): void
}

/** The engine of the version under review, with the pins that stand on it. */
export function ReviewStage({ drawing, version, lit, comparison, desk, stamp, onStage, onRenderer }: Props) {
  const { scene, model, clock, shown } = drawing
  const { beside, drawn } = comparison
  const stage = useRef<Stage | null>(null)
  const [name, setName] = useState<NamedView>('free')
  const [camera] = useState(() => scene.view.camera && cameraOf(scene.view.camera))
  useEffect(() => onThemeChange(() => stage.current?.retheme()), [])
  const look = useMemo<StageLook>(
    () => ({
      ...{ hidden: shown.hidden, ghost: shown.ghost, overlays: shown.overlays },
      ...{ lit: [...lit], balloons: [], forceUnit: shown.system === 'us' ? 'lbf' : 'N' },
    }),
    [shown, lit],
  )
  return (
    <section
      className={desk.mode.at === 'placing' ? 'stage review-stage is-placing' : 'stage review-stage'}
      aria-label="Drawing"
      onKeyDown={noteKeys(desk)}
    >
      <div className="stage-head">
        <p className="stage-words">
          <b>
            Version {version} at <LiveAngle clock={clock} />
          </b>
        </p>
        <span className="grow" />
        <Segmented
          label="Named views"
          value={name}
          options={viewOptions}
          onChange={(next) => {
            setName(next)
            stage.current?.view(next)
          }}
        />
      </div>
      <div className="stage-main">
        {beside === 'side' && drawn ? (
          <PairStage
            clock={clock}
            look={look}
            view={name}
            sides={[
              { model: drawn.model, title: `Version ${drawn.number}` },
              { model, title: `Version ${version}` },
            ]}
          />
        ) : (
          <GhostStage
            clock={clock}
            model={model}
            further={desk.layer.details}
            older={beside === 'ghost' && drawn ? drawn.rig : null}
            look={look}
            sectionAxial={shown.sectionAxialMm === null ? null : shown.sectionAxialMm / 1000}
            camera={camera}
            label={`Version ${version}, moving drawing`}
            description={`${scene.train.title}, ${scene.train.cylinders.length} cylinders. Arrow keys turn it, plus and minus zoom, Home frames it, brackets step the crank, space runs it, 1 to 6 are the named views.`}
            onStage={(next: Stage | null) => {
              stage.current = next
              onStage(next)
            }}
            onRenderer={(kind: RendererKind) => onRenderer(kind)}
            onCamera={() => desk.leaveView()}
            onPick={(part: string | null, world: ArrayLike<number>) => {
              if (desk.mode.at !== 'placing') desk.light(part)
              else if (part) void desk.pinAt(part, desk.layer.pointOn(part, world))
            }}
          />
        )}
        <NoteMarks desk={desk} />
        {stamp}
      </div>
    </section>
  )
}
