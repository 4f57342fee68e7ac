import type { Transaction } from '@/db/client'
import { judgedVersion, type JudgedVersion } from '@/db/queries/reviews'
import { lockScene } from '@/db/queries/scenes'
import type { Operation, Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import { config } from '@/lib/config'
import { notFound } from '@/lib/errors/problem'

export interface HeldScene {
  id: string
  workshopId: string
  title: string
  headVersion: number
  version: JudgedVersion
}

/**
 * A scene and one version of it, held until the transaction ends: acts on any of its versions come one after the other,
 * because what is done to one can change others.
 */
export async function holdVersion(
  tx: Transaction,
  person: Person | null,
  operation: Operation,
  id: string,
  number: number,
): Promise<HeldScene> {
  const scene = await lockScene(tx, id)
  authorise(person, operation, scene)
  return withVersion(tx, scene, number)
}

export async function withVersion(
  tx: Transaction,
  scene: Omit<HeldScene, 'version'>,
  number: number,
): Promise<HeldScene> {
  const version = await judgedVersion(tx, scene.id, number)
  if (!version) throw notFound('version')
  const { id, workshopId, title, headVersion } = scene
  return { id, workshopId, title, headVersion, version }
}

export const reviewUrl = (sceneId: string, version: number) =>
  `${config().origin}/scenes/${sceneId}/review?version=${version}`
