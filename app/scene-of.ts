import { notFound } from 'next/navigation'
import type { Person } from '@/lib/auth/access'
import { Problem } from '@/lib/errors/problem'
import { openScene } from '@/lib/services/open-scene'

/** A scene for a page. One that is not there and one that is somebody else's look alike. */
export async function sceneOf(person: Person, id: string, version?: number) {
  try {
    return await openScene(person, id, version)
  } catch (error) {
    if (error instanceof Problem && (error.kind === 'not-found' || error.kind === 'not-allowed')) notFound()
    throw error
  }
}
