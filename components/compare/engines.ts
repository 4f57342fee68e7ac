import { defaultView } from '@/scene/model/default-scene'
import { presets } from '@/scene/model/presets'
import type { CrankTrain } from '@/scene/model/crank-train'

/** An engine that stands beside the one on the bench. */
export interface Rival {
  /** Where it is from: preset:…, scene:… or file:… */
  key: string
  document: CrankTrain
  /** The speed it has when none is shared, rpm. */
  speedRpm: number
}

export const rivalOf = (
  key: string,
  document: CrankTrain,
  speedRpm = defaultView(document).speedRpm,
): Rival => ({
  key,
  document,
  speedRpm,
})

export function presetRival(id: string): Rival {
  const { train } = presets.find((preset) => preset.id === id)!
  return rivalOf(`preset:${id}`, train)
}

/** What to stand beside an engine before anybody has chosen: another preset with as many cylinders, else any other. */
export function firstRival(document: CrankTrain): Rival {
  const others = presets.filter(({ train }) => train.title !== document.title)
  const alike = others.find(({ train }) => train.cylinders.length === document.cylinders.length)
  return presetRival((alike ?? others[0]).id)
}
