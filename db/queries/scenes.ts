import { and, asc, desc, eq, isNotNull, isNull, sql, type SQL } from 'drizzle-orm'
import type { sceneLayouts, sceneSorts, sceneStates } from '@/lib/contracts/scenes'
import type { Transaction } from '../client'
import { folded, scenes, sceneVersions, users, versionStates } from '../schema'
import { itsState, stateOfVersion } from './version-state'

const row = {
  id: scenes.id,
  workshopId: scenes.workshopId,
  title: scenes.title,
  headVersion: scenes.headVersion,
  duplicatedFrom: scenes.duplicatedFrom,
  duplicatedFromVersion: scenes.duplicatedFromVersion,
  archivedAt: scenes.archivedAt,
  createdAt: scenes.createdAt,
  updatedAt: scenes.updatedAt,
  cylinderCount: sceneVersions.cylinderCount,
  displacementCc: sceneVersions.displacementCc,
  document: sceneVersions.document,
  message: sceneVersions.message,
  state: stateOfVersion,
  savedAt: sceneVersions.createdAt,
  savedBy: users.name,
}

const withHead = (tx: Transaction) =>
  tx
    .select(row)
    .from(scenes)
    .innerJoin(
      sceneVersions,
      and(eq(sceneVersions.sceneId, scenes.id), eq(sceneVersions.number, scenes.headVersion)),
    )
    .innerJoin(users, eq(users.id, sceneVersions.authorId))
    .leftJoin(versionStates, itsState)
    .$dynamic()

export type SceneRow = Awaited<ReturnType<typeof withHead>>[number]

export async function sceneById(tx: Transaction, id: string): Promise<SceneRow | undefined> {
  const [scene] = await withHead(tx).where(eq(scenes.id, id))
  return scene
}

/** The scene, held until the transaction ends: of two that change it at once the second waits for the first. */
export async function lockScene(tx: Transaction, id: string) {
  const [scene] = await tx.select().from(scenes).where(eq(scenes.id, id)).for('update')
  return scene
}

// the only columns a list can be sorted by
const sortColumns = {
  updated: { column: sql`${scenes.updatedAt}`, type: sql`timestamptz`, natural: 'down' },
  created: { column: sql`${scenes.createdAt}`, type: sql`timestamptz`, natural: 'down' },
  title: { column: folded(scenes.title), type: sql`text`, natural: 'up' },
} as const satisfies Record<(typeof sceneSorts)[number], { column: SQL; type: SQL; natural: 'up' | 'down' }>

const stateFilters: Record<(typeof sceneStates)[number], SQL | undefined> = {
  current: isNull(scenes.archivedAt),
  archived: isNotNull(scenes.archivedAt),
  all: undefined,
}

const usedBanks = sql`(
  select count(distinct cylinder ->> 'bank')
  from jsonb_array_elements(${sceneVersions.document} -> 'train' -> 'cylinders') as cylinder)`

const layoutFilters: Record<(typeof sceneLayouts)[number], SQL> = {
  single: sql`${sceneVersions.cylinderCount} = 1`,
  'in-line': sql`${sceneVersions.cylinderCount} > 1 and ${usedBanks} = 1`,
  'two-banks': sql`${usedBanks} = 2`,
  'more-banks': sql`${usedBanks} > 2`,
}

/** Where a page of a list ended: what it was sorted by, and the scene. */
export interface ScenePosition {
  value: string
  id: string
}

interface ScenePage {
  workshopId: string
  search?: string
  state: (typeof sceneStates)[number]
  layout?: (typeof sceneLayouts)[number]
  sort: (typeof sceneSorts)[number]
  order?: 'up' | 'down'
  after?: ScenePosition
  limit: number
}

const positionOf = (scene: SceneRow, sort: ScenePage['sort']): ScenePosition => ({
  value: {
    title: scene.title,
    updated: scene.updatedAt.toISOString(),
    created: scene.createdAt.toISOString(),
  }[sort],
  id: scene.id,
})

/** A page of a workshop's scenes by keyset: no page is counted off, and none shifts when a scene is added. */
export async function pageOfScenes(tx: Transaction, page: ScenePage) {
  const { column, type, natural } = sortColumns[page.sort]
  const up = (page.order ?? natural) === 'up'
  const { after } = page
  const bound = page.sort === 'title' ? folded(sql`${after?.value}::text`) : sql`${after?.value}::${type}`
  const pattern = page.search && `%${page.search.replace(/[\\%_]/g, '\\$&')}%`
  const rows = await withHead(tx)
    .where(
      and(
        eq(scenes.workshopId, page.workshopId),
        stateFilters[page.state],
        page.layout && layoutFilters[page.layout],
        pattern ? sql`${folded(scenes.title)} like ${folded(sql`${pattern}::text`)}` : undefined,
        after && sql`(${column}, ${scenes.id}) ${up ? sql`>` : sql`<`} (${bound}, ${after.id}::uuid)`,
      ),
    )
    .orderBy(up ? asc(column) : desc(column), up ? asc(scenes.id) : desc(scenes.id))
    .limit(page.limit + 1)
  const shown = rows.slice(0, page.limit)
  const last = shown.at(-1)
  return { scenes: shown, next: rows.length > page.limit && last ? positionOf(last, page.sort) : null }
}
