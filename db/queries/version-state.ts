import { and, eq, sql } from 'drizzle-orm'
import type { VersionState } from '@/lib/review/version-states'
import { sceneVersions, versionStates } from '../schema'

/** For a query of versions: joined to the left by this, their state is that; without a row it is a draft. */
export const itsState = and(
  eq(versionStates.sceneId, sceneVersions.sceneId),
  eq(versionStates.number, sceneVersions.number),
)
export const stateOfVersion = sql<VersionState>`coalesce(${versionStates.state}, 'draft')`
