import { fillViewProjection, namedCamera } from '@/scene/frame/camera'
import type { NamedView } from '@/scene/frame/named-views'
import type { Camera, Renderer, Rig } from '@/scene/frame/types'
import { sameCamera } from './camera-blend'
import { createEye } from './eye'
import { createLayers } from './layers'
import { createLoop } from './loop'
import { createPace } from './pace'
import { inkTheme, readPalette } from './palette'
import { createPicture, fillVisibility, turnPicture } from './picture'
import { createRendererSlot } from './renderer-slot'
import { createSigns } from './signs'
import { pageTicker } from './ticker'
import type { CreateStage, Details, MovingModel, Picture, RendererKind, StageLook } from './types'

export const createStage: CreateStage = (host, clock, events, options) => {
  const pane = options.pane !== undefined
  const layers = createLayers(host)
  const signs = createSigns(host)
  const eye = createEye(options.motion && !pane)
  const pace = createPace()
  const sheet = { width: 0, height: 0, ratio: 1 }

  let palette = readPalette(host)
  let model: MovingModel | null = null
  let look: StageLook | null = null
  let picture: Picture | null = null
  let details: Details | null = null
  /** The view that is kept on the sheet until a hand moves it. */
  let framed: NamedView | null = options.pane ?? 'free'
  let told: Camera | null = null
  let asked: RendererKind | 'auto' = pane ? 'canvas' : options.renderer
  /** What the renderer that draws has been told. */
  let heard: { renderer: Renderer | null; rig: Rig | null } = { renderer: null, rig: null }
  let turnedTo = NaN
  let drawnPicture: Picture | null = null
  let lastFrame = 0
  let seen = false

  const loop = createLoop({ draw, finish })
  const seat = pageTicker().join(clock, tick)
  const slot = createRendererSlot(layers, {
    onStanding() {
      slot.current?.setTheme(inkTheme(palette))
      slot.current?.resize(sheet.width, sheet.height, sheet.ratio)
      if (picture) tellRenderer(picture)
      touch()
    },
    onPainted: () => loop.painted(),
    onChoice(choice) {
      signs.renderer(choice.kind)
      pace.reset()
      events.onRenderer?.(choice.kind, choice.reason)
    },
  })

  function touch() {
    loop.touch()
    seat.wake()
  }

  function tick(now: number, seconds: number) {
    lastFrame = now
    if (!picture || !slot.current || sheet.width === 0 || sheet.height === 0) return false
    details?.tick()
    if (eye.step(now)) loop.touch()
    const more = loop.tick(now)
    if (asked === 'auto' && slot.kind === 'webgl' && clock.playing && pace.add(seconds)) slot.tooSlow()
    return more
  }

  function draw(still: boolean) {
    if (!picture || !slot.current) return false
    const { frame } = picture
    if (turnedTo !== clock.angle) {
      turnedTo = clock.angle
      turnPicture(picture, turnedTo)
      details?.turn(turnedTo)
    }
    fillViewProjection(frame.viewProjection, frame.eye, eye.camera, aspect())
    frame.still = still
    drawnPicture = picture
    return slot.current.draw(frame)
  }

  function finish(still: boolean) {
    if (!picture || picture !== drawnPicture) return
    details?.finish(still)
    const moves = signs.drawn(lastFrame, turnedTo, still)
    if (seen || (clock.playing && clock.rate !== 0 && !moves)) return
    seen = true
    events.onSeen?.()
  }

  /** A new model or look: new buffers where they must be, and the renderer told what it has not heard. */
  function standPicture() {
    if (!model || !look) return
    if (picture?.model !== model) {
      picture = createPicture(model)
      if (framed) eye.set(namedCamera(framed, model.rig, aspect()))
    }
    turnedTo = NaN
    details?.stand(picture, look)
    fillVisibility(picture, look)
    tellRenderer(picture)
    touch()
  }

  function tellRenderer({ rig, visibility }: Picture) {
    const renderer = slot.current
    if (!renderer) return
    if (heard.renderer !== renderer || heard.rig !== rig) renderer.setRig(rig)
    heard = { renderer, rig }
    renderer.setVisibility(visibility)
  }

  const aspect = () => (sheet.height > 0 ? sheet.width / sheet.height : 1)

  function resize() {
    const width = host.clientWidth
    const height = host.clientHeight
    Object.assign(sheet, { width, height, ratio: window.devicePixelRatio || 1 })
    if (width === 0 || height === 0) return
    slot.current?.resize(width, height, sheet.ratio)
    if (framed && model) eye.set(namedCamera(framed, model.rig, aspect()))
    details?.resize()
    touch()
  }

  function goTo(camera: Camera) {
    if (sameCamera(camera, eye.camera)) eye.set(camera)
    else eye.goTo(camera, performance.now())
    details?.resize()
    touch()
  }

  function frameAs(name: NamedView) {
    framed = name
    if (!model) return
    const camera = namedCamera(name, model.rig, aspect())
    goTo(camera)
    tellCamera(camera)
  }

  function tellCamera(camera: Camera) {
    told = structuredClone(camera)
    events.onCamera?.(structuredClone(camera))
  }

  const offClock = clock.subscribe(touch)
  const watch = new ResizeObserver(resize)
  watch.observe(host)
  const offManners = setManners(host, pane)
  let gone = false
  void document.fonts?.ready.then(() => !gone && touch())
  resize()
  slot.want(asked)

  return {
    setModel(next) {
      if (next === model) return
      model = next
      standPicture()
    },
    setLook(next) {
      if (next === look) return
      look = next
      standPicture()
    },
    setCamera(camera) {
      if (pane) return
      if (!camera) {
        framed = 'free'
        told = null
        if (model) goTo(namedCamera('free', model.rig, aspect()))
      } else if (!told || !sameCamera(told, camera)) {
        framed = null
        told = null
        goTo(camera)
      }
    },
    view: frameAs,
    setRenderer(kind) {
      if (pane || kind === asked) return
      asked = kind
      slot.want(kind)
    },
    retheme() {
      palette = readPalette(host)
      slot.current?.setTheme(inkTheme(palette))
      details?.retheme(palette)
      touch()
    },
    enrich(createDetails) {
      if (gone) return
      details = createDetails(
        {
          ...{ host, clock, events, pane, eye, sheet, touch, wake: seat.wake, view: frameAs },
          get palette() {
            return palette
          },
          move(camera) {
            framed = null
            eye.set(camera)
            touch()
          },
          moved() {
            touch()
            tellCamera(eye.camera)
          },
        },
        details,
      )
      standPicture()
    },
    dispose() {
      gone = true
      offClock()
      watch.disconnect()
      offManners()
      seat.leave()
      slot.dispose()
      details?.dispose()
      layers.remove()
      signs.clear()
    },
  }
}

/** The host is the caller's: only what it left open is set, and taken back at the end. */
function setManners(host: HTMLElement, pane: boolean): () => void {
  const wanted = pane ? { role: 'img' } : { role: 'application', tabindex: '0' }
  const set = Object.entries(wanted).filter(([name]) => !host.hasAttribute(name))
  for (const [name, value] of set) host.setAttribute(name, value)
  return () => {
    for (const [name] of set) host.removeAttribute(name)
  }
}
