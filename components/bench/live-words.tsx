'use client'

import { useEffect, useRef, useState } from 'react'
import { stateInWords } from '@/scene/frame/words'
import { useBench, useResults, useSessionState } from '@/scene/session/react'
import { useInstant } from './use-instant'

const ANNOUNCE_MS = 2000
const WRITE_MS = 120

/**
 * The drawing in words. Seen by everybody; told to a screen reader at most every two seconds, and while the engine runs
 * only if asked for.
 */
export function LiveWords({ still }: { still: boolean }) {
  const { clock } = useBench()
  const { train, model } = useResults()
  const system = useSessionState((state) => state.system)
  const [aloud, setAloud] = useState(false)
  const seen = useRef<HTMLParagraphElement>(null)
  const told = useRef<HTMLParagraphElement>(null)
  const written = useRef(0)
  const announced = useRef(0)
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)

  useInstant((instant) => {
    const now = performance.now()
    // While it runs, words that change more often than the eye reads are only noise.
    if (clock.playing && now - written.current < WRITE_MS) return
    written.current = now
    if (seen.current) seen.current.textContent = stateInWords(train, instant, model.events, system)
    if (clock.playing && !aloud) return
    timer.current ??= setTimeout(
      () => {
        timer.current = undefined
        if (!told.current || !seen.current || (clock.playing && !aloud)) return
        announced.current = performance.now()
        told.current.textContent = seen.current.textContent
      },
      Math.max(0, announced.current + ANNOUNCE_MS - now),
    )
  })
  useEffect(() => () => clearTimeout(timer.current), [])

  return (
    <div className="live-words">
      <p className="words" ref={seen} aria-hidden="true" />
      <p className="vh" ref={told} aria-live="polite" />
      {still ? null : (
        <button
          type="button"
          className="vh vh-focus btn sm"
          aria-pressed={aloud}
          onClick={() => setAloud(!aloud)}
        >
          Read the state out while it runs
        </button>
      )}
    </div>
  )
}
