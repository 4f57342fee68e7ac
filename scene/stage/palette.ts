import type { InkTheme } from '@/scene/frame/types'

/** The tokens of app/tokens.css that the drawing needs, as CSS writes them. */
const names = [
  'paper',
  'part',
  'metal',
  'ink',
  'ink-2',
  'line',
  'hair',
  'on-ink',
  'fire',
  'gas',
  'gas-ink',
  'inertia',
  'res',
  'pencil',
  'pencil-wash',
  'font-text',
  'font-fig',
  'font-head',
] as const

type Tokens = Record<(typeof names)[number], string>

/** With the canvas fonts of the legend, made once. */
export interface Palette extends Tokens {
  headFont: string
  figureFont: string
  textFont: string
}

export function readPalette(host: Element): Palette {
  const style = getComputedStyle(host)
  const tokens = Object.fromEntries(
    names.map((name) => [name, style.getPropertyValue(`--${name}`).trim()]),
  ) as Tokens
  return {
    ...tokens,
    headFont: `600 13px ${tokens['font-head']}`,
    figureFont: `400 12px ${tokens['font-fig']}`,
    textFont: `400 12px ${tokens['font-text']}`,
  }
}

/** A hexadecimal colour as a number; anything else would draw the engine in a colour nobody chose. */
export function hexColour(text: string): number {
  const digits = /^#([0-9a-f]{6})$/i.exec(text)?.[1] ?? text.replace(/^#(.)(.)(.)$/, '$1$1$2$2$3$3')
  const value = /^[0-9a-f]{6}$/i.test(digits) ? parseInt(digits, 16) : NaN
  if (Number.isNaN(value))
    throw new TypeError(`a token of the drawing is not a hexadecimal colour: "${text}"`)
  return value
}

export const inkTheme = (palette: Palette): InkTheme => ({
  paper: hexColour(palette.paper),
  part: hexColour(palette.part),
  metal: hexColour(palette.metal),
  ink: hexColour(palette.ink),
  line: hexColour(palette.line),
  pencil: hexColour(palette.pencil),
  pencilWash: hexColour(palette['pencil-wash']),
  gas: hexColour(palette.gas),
  fire: hexColour(palette.fire),
})
