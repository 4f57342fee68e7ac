'use client'

import { useImperativeHandle, useRef, type Ref } from 'react'
import { wrap } from '@/lib/numerics/wrap'
import type { Train } from '@/lib/mechanics/train'
import { tooFastToShow, type Beat } from './rhythm'

export interface MarksHandle {
  /** Lights the beat that was passed last, unless that would change more than three times a second. */
  show(angle: number, rate: number, cycle: number): void
  rest(): void
}

interface Props {
  train: Train
  beats: readonly Beat[]
  ref: Ref<MarksHandle>
}

/** The visible twin of the clicks: a mark a beat, in their sequence, left, right or between. */
export function RhythmMarks({ train, beats, ref }: Props) {
  const list = useRef<HTMLOListElement>(null)
  useImperativeHandle(ref, () => {
    const light = (now: number) => {
      const items = list.current?.children ?? []
      for (let i = 0; i < items.length; i++) items[i].classList.toggle('now', i === now)
    }
    return {
      show(angle, rate, cycle) {
        if (tooFastToShow(beats.length, cycle, rate)) return light(-1)
        let last = 0
        for (let i = 1; i < beats.length; i++)
          if (wrap(angle - beats[i].angle, cycle) < wrap(angle - beats[last].angle, cycle)) last = i
        light(last)
      },
      rest: () => light(-1),
    }
  }, [beats])
  return (
    <ol className="rhythm" ref={list} aria-label="Sequence of exhaust openings">
      {beats.map(({ cylinder, side }) => (
        <li key={cylinder} className="fig">
          <span className="rhythm-mark" aria-hidden="true" />
          {train.cylinders[cylinder].id}
          <span className="cap">{side < -0.1 ? 'left' : side > 0.1 ? 'right' : 'middle'}</span>
        </li>
      ))}
    </ol>
  )
}
