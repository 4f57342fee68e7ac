'use client'

import { createContext, useContext } from 'react'
import { useStore } from 'zustand'
import type { Clock } from './clock'
import type { Results } from './results'
import type { Session, SessionState } from './session'

/** What the parts of the bench share. The objects never change; their contents do. */
export interface BenchTools {
  session: Session
  clock: Clock
}

export const BenchContext = createContext<BenchTools | null>(null)
export const ResultsContext = createContext<Results | null>(null)

function held<T>(value: T | null, name: string): T {
  if (value === null) throw new Error(`${name} stands outside the bench`)
  return value
}

export const useBench = (): BenchTools => held(useContext(BenchContext), 'useBench')
export const useResults = (): Results => held(useContext(ResultsContext), 'useResults')
export const useSessionState = <T>(select: (state: SessionState) => T): T =>
  useStore(useBench().session, select)
