'use client'

import { createContext, useCallback, useContext, useEffect, useRef, useState, type ReactNode } from 'react'
import { Icon } from './icon'

interface Slip {
  text: string
  /** A tick when something was done, a dash when something is missing. */
  mark?: 'tick' | 'less'
  action?: { label: string; run(): void }
}

const SlipContext = createContext<(slip: Slip) => void>(() => {})

/** Puts a slip of paper at the foot of the sheet; it leaves after eight seconds, or at the next one. */
export const useSlip = () => useContext(SlipContext)

export function Slips({ children }: { children: ReactNode }) {
  const [slip, setSlip] = useState<Slip | null>(null)
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
  const show = useCallback((next: Slip) => {
    clearTimeout(timer.current)
    setSlip(next)
    timer.current = setTimeout(() => setSlip(null), 8000)
  }, [])
  useEffect(() => () => clearTimeout(timer.current), [])
  return (
    <SlipContext value={show}>
      {children}
      <div className="slips" role="status">
        {slip ? (
          <div className="slip">
            <Icon name={slip.mark ?? 'tick'} />
            <span>{slip.text}</span>
            {slip.action ? (
              <button
                type="button"
                className="btn sm txt"
                onClick={() => {
                  slip.action?.run()
                  setSlip(null)
                }}
              >
                {slip.action.label}
              </button>
            ) : null}
          </div>
        ) : null}
      </div>
    </SlipContext>
  )
}
