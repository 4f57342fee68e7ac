import { useMemo, useState } from 'react'
import useSWR from 'swr'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'
import type { listVersions, OpenedScene, VersionSummary } from '@/lib/contracts/scenes'
import type { Rig } from '@/scene/frame/types'
import type { Scene } from '@/scene/model/scene'
import { toTrain } from '@/scene/model/to-train'
import { buildStageModel } from '@/scene/stage/build-stage-model'
import type { StageModel } from '@/scene/stage/types'

/** How the older version is drawn: not at all, as outlines over the newer one, or beside it. */
export type Beside = 'alone' | 'ghost' | 'side'

/** What a version is compared with, shared by the list of changes and the drawing. */
export interface Comparison {
  sceneId: string
  version: number
  /** The version it is compared with; null where there is none before it. */
  older: number | null
  choose(older: number): void
  choices: VersionSummary[]
  beside: Beside
  setBeside(beside: Beside): void
  /** The older version, ready to be drawn; null until it is wanted and there. */
  drawn: { number: number; scene: Scene; rig: Rig; model: StageModel } | null
}

/** A version is never changed: what was read once holds. */
export const immutable = {
  revalidateOnFocus: false,
  revalidateIfStale: false,
  revalidateOnReconnect: false,
  shouldRetryOnError: false,
}

interface Version {
  number: number
  parent: number | null
  document: Scene
}

export function useComparison(sceneId: string, { number, parent, document }: Version): Comparison {
  const [chosen, setChosen] = useState<number | null>(null)
  const [beside, setBeside] = useState<Beside>('alone')
  const older = chosen ?? parent
  const { data: list } = useSWR<AnswerOf<typeof listVersions>>(
    addressOf('/api/v1/scenes/{id}/versions', { id: sceneId }, { limit: 100 }),
    readAddress,
    { revalidateOnFocus: false, shouldRetryOnError: false },
  )
  const { data: opened } = useSWR<OpenedScene>(
    older !== null && beside !== 'alone'
      ? addressOf('/api/v1/scenes/{id}/versions/{number}', { id: sceneId, number: older })
      : null,
    readAddress,
    immutable,
  )
  const { speedRpm } = document.view
  const drawn = useMemo(() => {
    if (!opened || beside === 'alone') return null
    const scene = opened.version.document
    const model = buildStageModel(scene.train, toTrain(scene.train), (speedRpm * 2 * Math.PI) / 60)
    return { number: opened.version.number, scene, rig: model.rig, model }
  }, [opened, beside, speedRpm])
  return {
    ...{ sceneId, version: number, older, beside, setBeside, drawn },
    choose: setChosen,
    choices: (list?.versions ?? []).filter((one) => one.number !== number),
  }
}
