'use client'

import { useEffect, useMemo, useRef, useState } from 'react'
import { Caution } from '@/components/figures/caution'
import { Leaf, LeafSection } from '@/components/figures/leaf'
import { onThemeChange } from '@/components/shell/theme'
import { Segmented } from '@/components/ui/segmented'
import { Switch } from '@/components/ui/switch'
import { formatNumber } from '@/lib/units/format'
import { toSi } from '@/lib/units/units'
import { directionOf } from '@/scene/frame/camera'
import type { NamedView } from '@/scene/frame/named-views'
import { equalised, type Equality } from '@/scene/model/equalised'
import { toTrain } from '@/scene/model/to-train'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import { buildStageModel } from '@/scene/stage/build-stage-model'
import {
  cameraOfShot,
  commonScale,
  newtonsPerCm,
  ownScale,
  shotOf,
  type Shot,
} from '@/scene/stage/shared-view'
import type { Stage, StageLook } from '@/scene/stage/types'
import { ComparePane } from './compare-pane'
import { DifferenceTable } from './difference-table'
import { EngineChoice } from './engine-choice'
import { firstRival, type Rival } from './engines'
import { OwnSpeed } from './own-speed'
import { useClocks } from './use-clocks'
import { useSize } from '@/components/ui/use-size'

/** Narrower than this there is room for one engine at a time. */
const ROOM_FOR_TWO = 640

const views: { value: NamedView; label: string }[] = [
  { value: 'free', label: 'Free' },
  { value: 'end', label: 'End' },
  { value: 'side', label: 'Side' },
  { value: 'top', label: 'Top' },
]

/** The leaf where the engine of the bench stands beside one or two others. */
export function CompareLeaf() {
  const { clock } = useBench()
  const { document, speedRpm } = useResults()
  const system = useSessionState((state) => state.system)
  const view = useSessionState((state) => state.scene.view)
  const [second, setSecond] = useState<Rival>(() => firstRival(document))
  const [third, setThird] = useState<Rival | null>(null)
  const [equality, setEquality] = useState<Equality>({ size: 'own', speed: 'rpm' })
  const [locks, setLocks] = useState({ clock: true, scale: true, camera: true })
  const [named, setNamed] = useState<NamedView>('free')
  const [moved, setMoved] = useState<{ shared: Shot | null; own: Record<number, Shot> }>({
    shared: null,
    own: {},
  })
  const [sheet, setSheet] = useState({ width: 480, height: 360 })
  const [single, setSingle] = useState('0')
  const [labels, setLabels] = useState(false)
  const stages = useRef(new Map<number, Stage>())
  const { ref, width } = useSize<HTMLDivElement>()
  useEffect(() => onThemeChange(() => stages.current.forEach((stage) => stage.retheme())), [])

  const compared = useMemo(
    () => equalised([{ document, speedRpm }, second, ...(third ? [third] : [])], equality),
    [document, speedRpm, second, third, equality],
  )
  const models = useMemo(
    () =>
      compared.map((each) =>
        buildStageModel(each.document, toTrain(each.document), toSi(each.speedRpm, 'rpm')),
      ),
    [compared],
  )
  const cycles = models.map(({ plan }) => plan.train.cycle)
  const clocks = useClocks(clock, cycles, locks.clock)
  const look = useMemo<StageLook>(
    () => ({
      hidden: view.hidden,
      ghost: view.ghost,
      overlays: { ...view.overlays, labels },
      lit: [],
      balloons: [],
      forceUnit: system === 'us' ? 'lbf' : 'N',
    }),
    [view.hidden, view.ghost, view.overlays, labels, system],
  )
  const framed = useMemo(
    () =>
      shotOf(
        models.map(({ rig }) => rig),
        sheet.width / sheet.height,
        directionOf(named, models[0].rig),
      ),
    [models, sheet, named],
  )
  const shots = models.map((_, i) => (locks.camera ? undefined : moved.own[i]) ?? moved.shared ?? framed)
  const scales = scalesOf(models, shots, sheet.height, locks.scale)

  const take = (i: number, shot: Shot) =>
    setMoved(({ own }) =>
      locks.camera ? { shared: shot, own: {} } : { ...moved, own: { ...own, [i]: shot } },
    )
  const lock = (name: keyof typeof locks) => (on: boolean) => {
    setLocks({ ...locks, [name]: on })
    if (name === 'camera') setMoved({ shared: on ? shots[0] : moved.shared, own: {} })
  }
  const narrow = width > 0 && width < ROOM_FOR_TWO
  const shown = narrow ? [Math.min(Number(single), models.length - 1)] : models.map((_, i) => i)
  const scaled = compared.slice(1).filter((each, i) => each.document !== [second, third][i]?.document)
  return (
    <Leaf
      title="Compare"
      sentence={`${compared.map(({ document: { title } }) => title).join(' beside ')}${sharedWords(equality)}.`}
    >
      <LeafSection title="Engines" wide>
        <div className="compare-choices" ref={ref}>
          <EngineChoice
            label="Second engine"
            rival={second}
            onChoose={(rival) => rival && setSecond(rival)}
            optional={false}
          />
          <EngineChoice label="Third engine" rival={third} onChoose={setThird} optional />
        </div>
        <div className="compare-choices">
          <span className="compare-switch">
            <span className="cap">Size</span>
            <Segmented
              label="Size"
              value={equality.size}
              options={[
                { value: 'own', label: 'As drawn' },
                { value: 'displacement', label: 'Equal displacement' },
              ]}
              onChange={(size) => setEquality({ ...equality, size })}
            />
          </span>
          <span className="compare-switch">
            <span className="cap">Speed</span>
            <Segmented
              label="Speed"
              value={equality.speed}
              options={[
                { value: 'rpm', label: 'Equal rpm' },
                { value: 'piston-speed', label: 'Equal piston speed' },
                { value: 'own', label: 'Each its own' },
              ]}
              onChange={(speed) => setEquality({ ...equality, speed })}
            />
          </span>
        </div>
        {equality.speed === 'own' ? (
          <div className="compare-choices">
            <OwnSpeed
              key={second.key}
              label="Speed of the second engine"
              speedRpm={second.speedRpm}
              onSpeed={(speed) =>
                setSecond((rival) => (rival.speedRpm === speed ? rival : { ...rival, speedRpm: speed }))
              }
            />
            {third ? (
              <OwnSpeed
                key={third.key}
                label="Speed of the third engine"
                speedRpm={third.speedRpm}
                onSpeed={(speed) =>
                  setThird((rival) =>
                    rival === null || rival.speedRpm === speed ? rival : { ...rival, speedRpm: speed },
                  )
                }
              />
            ) : null}
          </div>
        ) : null}
        <div className="compare-choices" role="group" aria-label="What the drawings share">
          <Switch label="One clock" on={locks.clock} onChange={lock('clock')} />
          <Switch label="One scale of force" on={locks.scale} onChange={lock('scale')} />
          <Switch label="One camera" on={locks.camera} onChange={lock('camera')} />
          <Switch label="Labels" on={labels} onChange={setLabels} />
          <Segmented
            label="View"
            value={named}
            options={views}
            onChange={(next) => {
              setNamed(next)
              setMoved({ shared: null, own: {} })
            }}
          />
        </div>
        {scaled.length > 0 ? (
          <p className="cap">
            Equal displacement by similarity: all lengths of the other engine by one factor, masses by its
            cube; angles, order and pressures stay.
          </p>
        ) : null}
        {narrow ? (
          <Segmented
            label="Engine shown"
            className="compare-switcher"
            value={String(shown[0])}
            options={models.map((_, i) => ({
              value: String(i),
              label: i === 0 ? 'On the bench' : `Engine ${i + 1}`,
            }))}
            onChange={setSingle}
          />
        ) : null}
        <div className={`compare-panes of-${shown.length}`}>
          {shown.map((i) => (
            <ComparePane
              key={i}
              number={i + 1}
              compared={compared[i]}
              model={models[i]}
              look={look}
              shot={shots[i]}
              clock={clocks[i]}
              apart={clocks[i] !== clock}
              metresPerNewton={scales[i]}
              system={system}
              onShot={(shot) => take(i, shot)}
              onSize={setSheet}
              onStage={(stage) => void (stage ? stages.current.set(i, stage) : stages.current.delete(i))}
            />
          ))}
        </div>
      </LeafSection>
      <LeafSection title="What differs" at={speedWords(compared.map((each) => each.speedRpm))} wide>
        <DifferenceTable compared={compared} system={system} />
      </LeafSection>
      <Caution />
    </Leaf>
  )
}

/** One scale of force is as many newtons a centimetre in every pane, whatever its camera's distance. */
function scalesOf(
  models: ReturnType<typeof buildStageModel>[],
  shots: readonly Shot[],
  height: number,
  together: boolean,
): number[] {
  if (!together) return models.map(ownScale)
  const common = commonScale(models)
  const perCm = models.map(({ rig }, i) => newtonsPerCm(common, cameraOfShot(shots[i], rig), height))
  return perCm.map((each) => (common * each) / perCm[0])
}

const speedWords = (speeds: number[]) => {
  const words = speeds.map((speed) => formatNumber(speed, { decimals: 0 }))
  return `at ${new Set(words).size === 1 ? words[0] : words.join(', ')} rpm`
}

function sharedWords({ size, speed }: Equality): string {
  const shared = [
    ...(size === 'displacement' ? ['displacement'] : []),
    ...(speed === 'rpm' ? ['rpm'] : speed === 'piston-speed' ? ['mean piston speed'] : []),
  ]
  return shared.length === 0 ? ', each as it is' : `, at equal ${shared.join(' and ')}`
}
