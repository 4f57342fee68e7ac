import type { Train } from '@/lib/mechanics/train'
import type { Shape } from './shape'

/** A stretch of the crank along its axis, m. */
export interface Stretch {
  from: number
  to: number
}
export interface Journal extends Stretch {
  /** Index into `train.mains`, −1 where the document names no main and the crank ends in a plain stub. */
  main: number
}
export interface Pin extends Stretch {
  throw: number
}
/** A web joins the throw at `throw` to a journal (`other` −1) or to the next throw. */
export interface Web extends Stretch {
  throw: number
  other: number
  side: 'free' | 'drive'
}
export interface CrankLayout {
  journals: Journal[]
  pins: Pin[]
  webs: Web[]
}

interface Station {
  axial: number
  main: number // index or −1
  throw: number // index or −1
  free: number // where it ends towards the free end
  drive: number
}

/** A gap thinner than this share of a web is no web: the two pins stand face to face. */
const THINNEST = 0.15

/** Where pins, webs and journals lie along the crank, fitted to the room between the document's axial places. */
export function crankLayout(train: Train, shape: Shape): CrankLayout {
  const stations = setOut(train, shape)
  const layout: CrankLayout = { journals: [], pins: [], webs: [] }
  for (let i = 0; i + 1 < stations.length; i++) {
    const web = join(train, shape, stations[i], stations[i + 1])
    if (web) layout.webs.push(web)
  }
  for (const station of stations) {
    const stretch = { from: station.free, to: station.drive }
    if (station.throw >= 0) layout.pins.push({ ...stretch, throw: station.throw })
    else layout.journals.push({ ...stretch, main: station.main })
  }
  return layout
}

function setOut({ mains, throws }: Train, shape: Shape): Station[] {
  const station = (axial: number, main: number, own: number) => ({
    axial,
    main,
    throw: own,
    free: 0,
    drive: 0,
  })
  const stations: Station[] = [
    ...mains.map(({ axial }, main) => station(axial, main, -1)),
    ...throws.map(({ axial }, own) => station(axial, -1, own)),
  ].sort((a, b) => a.axial - b.axial || a.throw - b.throw)
  stations.forEach((here, i) => {
    // two at one place, as while a place is being typed, are drawn a little apart
    if (i > 0) here.axial = Math.max(here.axial, stations[i - 1].axial + THINNEST * shape.webThickness)
    here.free = here.axial - shape.mainLength / 2
    here.drive = here.axial + shape.mainLength / 2
  })
  spreadPins(stations, shape.pinLength)
  return withStubs(stations, shape)
}

/** Where the outermost station is a throw, the crank ends in a plain stub beyond its web. */
function withStubs(stations: Station[], { webThickness, mainLength }: Shape): Station[] {
  const stub = (free: number): Station => {
    return { axial: free + mainLength / 2, main: -1, throw: -1, free, drive: free + mainLength }
  }
  const first = stations[0]
  const last = stations[stations.length - 1]
  return [
    ...(first.throw >= 0 ? [stub(first.free - webThickness - mainLength)] : []),
    ...stations,
    ...(last.throw >= 0 ? [stub(last.drive + webThickness)] : []),
  ]
}

/** Throws side by side that stand closer than a pin is long share that length; others have it each. */
function spreadPins(stations: Station[], length: number) {
  for (let i = 0; i < stations.length; i++) {
    if (stations[i].throw < 0) continue
    let end = i
    while (end + 1 < stations.length && stations[end + 1].throw >= 0) {
      if (stations[end + 1].axial - stations[end].axial >= length) break
      end++
    }
    const pair = stations.slice(i, end + 1)
    const middle = (pair[0].axial + pair[pair.length - 1].axial) / 2
    const span = pair[pair.length - 1].axial - pair[0].axial
    const share = Math.max(length, span + 0.5 * length)
    pair.forEach((station, k) => {
      station.free = k === 0 ? middle - share / 2 : (pair[k - 1].axial + station.axial) / 2
      station.drive = k === pair.length - 1 ? middle + share / 2 : (pair[k + 1].axial + station.axial) / 2
    })
    i = end
  }
}

/** Fits the two stations' facing ends to the room between them and puts a web there where one belongs. */
function join(train: Train, shape: Shape, a: Station, b: Station): Web | undefined {
  const gap = b.free - a.drive
  const room = b.axial - a.axial
  if (a.throw < 0 && b.throw < 0) {
    a.drive = b.free = (a.axial + b.axial) / 2
    return undefined
  }
  if (a.throw >= 0 && b.throw >= 0) {
    const one = train.throws[a.throw]
    const other = train.throws[b.throw]
    const inLine = Math.abs(Math.sin((one.angle - other.angle) / 2)) < 1e-3 && one.radius === other.radius
    if (inLine || gap < THINNEST * shape.webThickness) {
      a.drive = b.free = (a.drive + b.free) / 2
      return undefined
    }
    return { from: a.drive, to: b.free, throw: a.throw, other: b.throw, side: 'drive' }
  }
  const wanted = shape.webThickness
  if (gap < wanted) {
    const scale = room / (room - gap + wanted)
    a.drive = a.axial + (a.drive - a.axial) * scale
    b.free = b.axial - (b.axial - b.free) * scale
  } else if (a.throw >= 0) b.free = a.drive + wanted
  else a.drive = b.free - wanted
  const pin = a.throw >= 0 ? a : b
  return { from: a.drive, to: b.free, throw: pin.throw, other: -1, side: pin === a ? 'drive' : 'free' }
}
