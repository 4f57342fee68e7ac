import { fillViewProjection, namedCamera } from '@/scene/frame/camera'
import { buildRay, fillRay, pickPart } from '@/scene/frame/picking'
import type { Camera, Renderer, Rig } from '@/scene/frame/types'
import { createBalloons } from './balloons'
import { sameCamera } from './camera-moves'
import { createEye } from './eye'
import type { Point } from './gestures'
import { layHands } from './hands'
import { createLabels } from './labels'
import { createLayers } from './layers'
import { createLoop } from './loop'
import { legendRoom } from './legend'
import { createOverlay, legendRows, paintOverlay, type Overlay, type OverlayView } from './overlay'
import { createPace } from './pace'
import { inkTheme, readPalette } from './palette'
import { createPicture, fillVisibility, turnPicture, type Picture } from './picture'
import { createRendererSlot } from './renderer-slot'
import { createSigns } from './signs'
import { steady } from './steady'
import { pageTicker } from './ticker'
import type { CreateStage, NamedView, RendererKind, StageLook, StageModel } from './types'
import { listWords, placeWords, type WordSheet } from './words'

export const createStage: CreateStage = (host, clock, events, options) => {
  const pane = options.pane !== undefined
  const layers = createLayers(host)
  const signs = createSigns(host)
  const labels = createLabels(layers.written)
  const balloons = createBalloons(layers.written, (number) => events.onBalloon?.(number))
  const eye = createEye(options.motion && !pane)
  const pace = createPace()
  const ray = buildRay()

  let palette = readPalette(host)
  let model: StageModel | null = null
  let look: StageLook | null = null
  let picture: Picture | null = null
  let overlay: Overlay | null = null
  let view: (OverlayView & WordSheet) | null = null
  /** The view that is kept on the sheet until a hand moves it. */
  let framed: NamedView | null = options.pane ?? 'free'
  let told: Camera | null = null
  let width = 0
  let height = 0
  let ratio = 1
  let asked: RendererKind | 'auto' = pane ? 'canvas' : options.renderer
  /** What the renderer that draws has been told. */
  let heard: { renderer: Renderer | null; rig: Rig | null } = { renderer: null, rig: null }
  let turnedTo = NaN
  let drawnPicture: Picture | null = null
  let pointer: Point | null = null
  let pointed = false
  let hovered: string | null = null
  let lastFrame = 0

  const loop = createLoop({ draw, finish })
  const seat = pageTicker().join(clock, tick)
  const slot = createRendererSlot(layers, {
    onStanding() {
      slot.current?.setTheme(inkTheme(palette))
      slot.current?.resize(width, height, ratio)
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
    if (!picture || !slot.current || width === 0 || height === 0) return false
    if (pointed) hoverNow()
    if (eye.step(now)) loop.touch()
    const more = loop.tick(now)
    if (asked === 'auto' && slot.kind === 'webgl' && clock.playing && pace.add(seconds)) slot.tooSlow()
    return more
  }

  function draw(still: boolean) {
    if (!picture || !look || !slot.current) return false
    const { frame } = picture
    if (turnedTo !== clock.angle) {
      turnedTo = clock.angle
      turnPicture(picture, clock.angle, look.overlays.pressure && !steady(clock, picture.model.events))
    }
    fillViewProjection(frame.viewProjection, frame.eye, eye.camera, width / height)
    frame.still = still
    drawnPicture = picture
    return slot.current.draw(frame)
  }

  function finish(still: boolean) {
    if (!picture || picture !== drawnPicture || !overlay || !view || !look) return
    if (!still) events.onTick?.(picture.instant)
    view.steadily = steady(clock, picture.model.events)
    layers.resize(width, height, ratio)
    paintOverlay(layers.pen, overlay, view)
    if (!pane) {
      balloons.place(picture, width, height, still)
      balloons.paint(layers.pen, palette)
      placeWords(labels, picture, view)
    }
    signs.drawn(lastFrame, picture.instant.angle, still)
  }

  /** A new model, section or look: new buffers where they must be, and the renderer told what it has not heard. */
  function standPicture() {
    if (!model || !look) return
    if (!picture || picture.model !== model || picture.sectionAxial !== look.sectionAxial) {
      picture = createPicture(model, look.sectionAxial)
      overlay = createOverlay(picture)
      hovered = null
      if (framed) eye.set(namedCamera(framed, model.rig, aspect()))
    }
    turnedTo = NaN
    const rows = pane ? [] : legendRows(look)
    view = {
      camera: eye.camera,
      look,
      palette,
      width,
      height,
      steadily: false,
      rows,
      legend: legendRoom(rows),
    }
    fillVisibility(picture, look)
    tellRenderer(picture)
    if (!pane) {
      labels.set(listWords(picture, look))
      balloons.set(look.balloons)
    }
    touch()
  }

  function tellRenderer({ rig, visibility }: Picture) {
    const renderer = slot.current
    if (!renderer) return
    if (heard.renderer !== renderer || heard.rig !== rig) renderer.setRig(rig)
    heard = { renderer, rig }
    renderer.setVisibility(visibility)
  }

  const aspect = () => (height > 0 ? width / height : 1)

  function resize() {
    width = host.clientWidth
    height = host.clientHeight
    ratio = window.devicePixelRatio || 1
    if (width === 0 || height === 0) return
    slot.current?.resize(width, height, ratio)
    if (framed && model) eye.set(namedCamera(framed, model.rig, aspect()))
    if (view) Object.assign(view, { width, height })
    balloons.unsettle()
    touch()
  }

  function goTo(camera: Camera) {
    if (sameCamera(camera, eye.camera)) eye.set(camera)
    else eye.goTo(camera, performance.now())
    balloons.unsettle()
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

  function partAt(at: Point): string | null {
    if (!picture || Number.isNaN(turnedTo)) return null
    const { rig, pose, visibility } = picture
    fillRay(ray, eye.camera, aspect(), (2 * at.x) / width - 1, 1 - (2 * at.y) / height)
    return rig.parts[pickPart(rig, pose, visibility, ray)]?.id ?? null
  }

  function hoverNow() {
    pointed = false
    const part = pointer && partAt(pointer)
    if (part === hovered) return
    hovered = part
    events.onHover?.(part)
  }

  const offClock = clock.subscribe(touch)
  const watch = new ResizeObserver(resize)
  watch.observe(host)
  const offHands = pane
    ? () => {}
    : layHands(host, layers.surface, {
        clock,
        camera: eye.camera,
        sheet: () => (model && height > 0 ? { width, height, bounds: model.rig.bounds } : null),
        move(camera) {
          framed = null
          eye.set(camera)
          touch()
        },
        moved() {
          balloons.unsettle()
          touch()
          tellCamera(eye.camera)
        },
        view: frameAs,
        pick: (at) => events.onPick?.(partAt(at)),
        hover(at) {
          pointer = at
          pointed = true
          seat.wake()
        },
      })
  const offManners = setManners(host, layers.surface, pane)
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
      if (view) view.palette = palette
      touch()
    },
    dispose() {
      gone = true
      offClock()
      watch.disconnect()
      offHands()
      offManners()
      seat.leave()
      slot.dispose()
      layers.remove()
      signs.clear()
    },
  }
}

/** The host is the caller's: only what it left open is set, and taken back at the end. */
function setManners(host: HTMLElement, surface: HTMLElement, pane: boolean): () => void {
  const wanted = pane ? { role: 'img' } : { role: 'application', tabindex: '0' }
  const set = Object.entries(wanted).filter(([name]) => !host.hasAttribute(name))
  for (const [name, value] of set) host.setAttribute(name, value)
  if (pane) surface.classList.replace('stage-surface', 'stage-over')
  return () => {
    for (const [name] of set) host.removeAttribute(name)
  }
}
