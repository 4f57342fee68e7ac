import '@/app/tokens.css'
import { crankTrainSchema } from '@/scene/model/crank-train'
import type { StageLook } from '@/scene/stage/types'
import { toTrain } from '@/scene/model/to-train'
import { createClock } from '@/scene/session/clock'
import { buildStageModel } from '@/scene/stage/build-stage-model'
import { createDetails } from '@/scene/stage/create-details'
import { createStage } from '@/scene/stage/create-stage'
import { cutRig } from '@/scene/stage/cut-rig'
import { createPinLayer } from '@/scene/stage/pins'
import type { NamedView, RendererKind } from '@/scene/stage/types'

/** A page with nothing but a stage, steered by its address and by `window.harness`. */
const ask = new URLSearchParams(location.search)
async function readModel(preset: string, rpm: number) {
  const { default: json } = await import(`../../../scene/model/presets/${preset}.json`)
  const document = crankTrainSchema.parse(json)
  const train = toTrain(document)
  const model = buildStageModel(document, train, (rpm * 2 * Math.PI) / 60)
  return { ...model, rig: cutRig(model.rig, ask.has('section') ? Number(ask.get('section')) : null) }
}

const look: StageLook = {
  hidden: [],
  ghost: [],
  overlays: {
    gas: false,
    inertia: false,
    total: false,
    on: { pistons: true, crankPins: false, mains: false },
    shaking: false,
    orbit: false,
    firing: false,
    pressure: false,
    labels: false,
  },
  lit: [],
  balloons: [],
  forceUnit: 'N',
}

if (ask.has('theme')) document.documentElement.dataset.theme = ask.get('theme') ?? ''
const host = document.querySelector<HTMLElement>('#host')
if (!host) throw new Error('the page has no host')
const size = ask.get('size')?.split('x')
if (size) Object.assign(host.style, { width: `${size[0]}px`, height: `${size[1]}px` })

const events: { name: string; value: unknown }[] = []
const tell = (name: string) => (value: unknown, more?: unknown) =>
  void events.push({ name, value: more === undefined ? value : [value, more] })

const clock = createClock()
const model = await readModel(ask.get('preset') ?? 'v8x-5000', Number(ask.get('rpm') ?? 6000))
clock.setCycle(model.plan.train.cycle)
clock.setAngle((Number(ask.get('angle') ?? 0) * Math.PI) / 180)

const mount = (element: HTMLElement, pane?: NamedView) => {
  const stage = createStage(
    element,
    clock,
    {
      onPick: (part) => tell('pick')(part),
      onHover: tell('hover'),
      onBalloon: tell('balloon'),
      onCamera: tell('camera'),
      onRenderer: tell('renderer'),
      onSeen: () => tell('seen')(true),
      onTick: () => void ticks.count++,
    },
    { renderer: (ask.get('renderer') ?? 'auto') as RendererKind | 'auto', pane, motion: ask.has('motion') },
  )
  if (ask.has('bare')) stage.setModel({ rig: model.rig })
  else {
    stage.enrich(createDetails)
    stage.setModel(model)
  }
  const wished = JSON.parse(ask.get('look') ?? '{}')
  stage.setLook({ ...look, ...wished, overlays: { ...look.overlays, ...wished.overlays } })
  return stage
}
const ticks = { count: 0 }
const stage = mount(host)
const pins = createPinLayer()
pins.listen((number) => tell('pin')(number))
if (ask.has('pins')) {
  stage.enrich(pins.details)
  pins.set(JSON.parse(ask.get('pins') ?? '[]'))
}
const view = ask.get('view')
if (view) stage.view(view as NamedView)

const enrich = () => {
  stage.enrich(createDetails)
  stage.setModel(model)
}

const harness = { stage, pins, enrich, clock, events, ticks, model, look, mount, readModel, host }
export type Harness = typeof harness
Object.assign(window, { harness })
