'use client'

import { useDeferredValue } from 'react'
import { clearanceList, type ClearanceList } from '@/scene/frame/clearance-list'
import { useResults } from '@/scene/session/react'
import type { Results } from '@/scene/session/results'

const known = new WeakMap<Results['model']['rig'], ClearanceList>()

export interface Clearances extends ClearanceList {
  /** What they were worked out from: a moment behind what is being typed. */
  results: Results
}

/** The clearances of the engine, worked out once for every document and never before what was typed stands in its field. */
export function useClearances(): Clearances {
  const results = useDeferredValue(useResults())
  const { document, train, model } = results
  let list = known.get(model.rig)
  if (!list) {
    list = clearanceList(document, train, model.rig)
    known.set(model.rig, list)
  }
  return { ...list, results }
}
