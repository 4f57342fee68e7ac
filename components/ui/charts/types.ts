import type { ReactNode } from 'react'
import type { Column, Table } from '@/lib/tables/table'

/** How a line stands in the sheet: `res` double, `gas` solid, `inertia` dashed, `v` plain ink, `past` fine and dotted. */
export type Look = 'res' | 'gas' | 'inertia' | 'v' | 'past'

export interface Axis {
  name: string
  unit: string
  format(value: number): string
  /** How files carry it, where the shown unit is not SI. */
  si?: Column['si']
}

/** What can be read off a chart, point by point, by pointer and by key. */
export interface Points {
  count: number
  place(index: number): { x: number; y: number }
  words(index: number): string
}

/** What a chart draws at the width it has. */
export interface Drawn {
  height: number
  picture: ReactNode
  points?: Points
}

export interface ChartProps {
  title: string
  /** What it shows, in one sentence. */
  sentence: string
  /** In a margin note, where the note's heading is the title and there is little room. */
  compact?: boolean
  /** A point was clicked, or chosen with Enter. */
  onChoose?(index: number): void
}

export interface FrameProps extends ChartProps {
  table: Table
  /** The x of the point nearest to a pointer counts alone, as over a time axis. */
  along?: boolean
  children(width: number): Drawn
}
