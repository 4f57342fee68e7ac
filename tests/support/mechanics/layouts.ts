import type { Place } from './layout'

type Row = [max: number, forward?: number, backward?: number]

interface Layout {
  places: Place[]
  force1: Row
  couple1?: Row
  force2: Row
  couple2?: Row
}

const middle = (n: number, i: number) => i - (n - 1) / 2
const inLine = (...pins: number[]): Place[] =>
  pins.map((pin, i) => ({ pin, bank: 0, z: middle(pins.length, i) }))
/** Two rods on each pin; `split` is how far the second bank's pin stands ahead. */
const vee = (angle: number, pins: number[], split = 0): Place[] =>
  pins.flatMap((pin, i) => [
    { pin, bank: -angle / 2, z: middle(pins.length, i) },
    { pin: pin + split, bank: angle / 2, z: middle(pins.length, i) },
  ])
const radial = (n: number): Place[] =>
  Array.from({ length: n }, (_, i) => ({ pin: 0, bank: (360 * i) / n, z: 0 }))
/** One throw a cylinder, banks at −90° and +90° by turns. */
const boxer = (...pins: number[]): Place[] =>
  pins.map((pin, i) => ({ pin, bank: i % 2 === 0 ? -90 : 90, z: middle(pins.length, i) }))
/** The pins of an even two-stroke in-line engine from its firing order. */
const fromOrder = (...order: number[]) =>
  inLine(...order.map((_, i) => (360 - (360 * order.indexOf(i + 1)) / order.length) % 360))

const zero: Row = [0, 0, 0]
const half = (max: number): Row => [max, max / 2, max / 2]
const five = [0, 216, 144, 72, 288]
const six = [0, 240, 120, 120, 240, 0]

/** Order 1 and 2: force in F1, F2 and couple in F1·a, F2·a. Standard handbook coefficients, from memory. */
export const layouts: Record<string, Layout> = {
  Single: { places: inLine(0), force1: half(1), force2: half(1) },
  'I2 360': { places: inLine(0, 0), force1: half(2), couple1: zero, force2: half(2), couple2: zero },
  'I2 180': { places: inLine(0, 180), force1: zero, couple1: half(1), force2: half(2), couple2: zero },
  'I2 270': {
    places: inLine(0, 90),
    force1: half(1.414),
    couple1: half(0.7071),
    force2: zero,
    couple2: half(1),
  },
  'I3 120': {
    places: inLine(0, 240, 120),
    force1: zero,
    couple1: half(1.7321),
    force2: zero,
    couple2: half(1.7321),
  },
  'I4 0-180-180-0': {
    places: inLine(0, 180, 180, 0),
    force1: zero,
    couple1: zero,
    force2: half(4),
    couple2: zero,
  },
  'I4 0-270-90-180': {
    places: inLine(0, 270, 90, 180),
    force1: zero,
    couple1: half(3.1623),
    force2: zero,
    couple2: zero,
  },
  'I4 0-180-270-90': {
    places: inLine(0, 180, 270, 90),
    force1: zero,
    couple1: [1.414],
    force2: zero,
    couple2: [4],
  },
  'I5 1-2-4-5-3': {
    places: inLine(...five),
    force1: zero,
    couple1: half(0.449),
    force2: zero,
    couple2: half(4.98),
  },
  'I6 1-5-3-6-2-4': { places: inLine(...six), force1: zero, couple1: zero, force2: zero, couple2: zero },
  'I8 0-180-90-270-270-90-180-0': {
    places: inLine(0, 180, 90, 270, 270, 90, 180, 0),
    force1: zero,
    couple1: zero,
    force2: zero,
    couple2: zero,
  },
  'two-stroke I3 1-3-2': {
    places: fromOrder(1, 3, 2),
    force1: zero,
    couple1: [1.732],
    force2: zero,
    couple2: [1.732],
  },
  'two-stroke I4 1-3-2-4': {
    places: fromOrder(1, 3, 2, 4),
    force1: zero,
    couple1: [1.414],
    force2: zero,
    couple2: [4],
  },
  'two-stroke I5 1-4-3-2-5': {
    places: fromOrder(1, 4, 3, 2, 5),
    force1: zero,
    couple1: [0.449],
    force2: zero,
    couple2: [4.98],
  },
  'two-stroke I6 1-5-3-4-2-6': {
    places: fromOrder(1, 5, 3, 4, 2, 6),
    force1: zero,
    couple1: [0],
    force2: zero,
    couple2: [3.464],
  },
  'two-stroke I7 1-7-2-5-4-3-6': {
    places: fromOrder(1, 7, 2, 5, 4, 3, 6),
    force1: zero,
    couple1: [0.267],
    force2: zero,
    couple2: [1.006],
  },
  'two-stroke I8 1-8-3-4-7-2-5-6': {
    places: fromOrder(1, 8, 3, 4, 7, 2, 5, 6),
    force1: zero,
    couple1: [0.897],
    force2: zero,
    couple2: [0],
  },
  'V2 45 common': { places: vee(45, [0]), force1: [1.707, 1, 0.7071], force2: [1.307, 0.924, 0.383] },
  'V2 60 common': { places: vee(60, [0]), force1: [1.5, 1, 0.5], force2: [0.866, 0.866, 0] },
  'V2 90 common': { places: vee(90, [0]), force1: [1, 1, 0], force2: [1.414, 0.7071, 0.7071] },
  'V4 90 flat': {
    places: vee(90, [0, 180]),
    force1: zero,
    couple1: [1, 1, 0],
    force2: [2.828, 1.414, 1.414],
    couple2: zero,
  },
  'V6 60 six-throw': {
    places: vee(60, [0, 240, 120], -60),
    force1: zero,
    couple1: [1.5, 1.5, 0],
    force2: zero,
    couple2: [1.5, 0, 1.5],
  },
  'V6 90 common': {
    places: vee(90, [0, 240, 120]),
    force1: zero,
    couple1: [1.732, 1.732, 0],
    force2: zero,
    couple2: [2.449, 1.225, 1.225],
  },
  'V6 90 split 30': {
    places: vee(90, [0, 120, 240], -30),
    force1: zero,
    couple1: [2.121, 1.673, 0.448],
    force2: zero,
    couple2: [2.121, 0.448, 1.673],
  },
  'V6 120 common': {
    places: vee(120, [0, 240, 120]),
    force1: zero,
    couple1: [2.598, 1.732, 0.866],
    force2: zero,
    couple2: [2.598, 0.866, 1.732],
  },
  'V8 90 cross': {
    places: vee(90, [0, 90, 270, 180]),
    force1: zero,
    couple1: [3.162, 3.162, 0],
    force2: zero,
    couple2: zero,
  },
  'V8 90 flat': {
    places: vee(90, [0, 180, 180, 0]),
    force1: zero,
    couple1: zero,
    force2: [5.657, 2.828, 2.828],
    couple2: zero,
  },
  'V8 60 flat': {
    places: vee(60, [0, 180, 180, 0]),
    force1: zero,
    couple1: zero,
    force2: [3.464, 3.464, 0],
    couple2: zero,
  },
  'V10 72 common': {
    places: vee(72, five),
    force1: zero,
    couple1: [0.588, 0.449, 0.139],
    force2: zero,
    couple2: [5.568, 4.029, 1.539],
  },
  'V10 90 common': {
    places: vee(90, five),
    force1: zero,
    couple1: [0.449, 0.449, 0],
    force2: zero,
    couple2: [7.042, 3.521, 3.521],
  },
  'V12 60 common': { places: vee(60, six), force1: zero, couple1: zero, force2: zero, couple2: zero },
  'V12 90 common': { places: vee(90, six), force1: zero, couple1: zero, force2: zero, couple2: zero },
  'Boxer 2': { places: boxer(0, 180), force1: zero, couple1: half(1), force2: zero, couple2: half(1) },
  'Boxer 4': { places: boxer(0, 180, 180, 0), force1: zero, couple1: zero, force2: zero, couple2: half(2) },
  'Boxer 6': {
    places: boxer(0, 180, 120, 300, 240, 60),
    force1: zero,
    couple1: zero,
    force2: zero,
    couple2: zero,
  },
  'Radial 3': { places: radial(3), force1: [1.5, 1.5, 0], force2: [1.5, 0, 1.5] },
  'Radial 5': { places: radial(5), force1: [2.5, 2.5, 0], force2: zero },
  'Radial 7': { places: radial(7), force1: [3.5, 3.5, 0], force2: zero },
  'Radial 9': { places: radial(9), force1: [4.5, 4.5, 0], force2: zero },
}
