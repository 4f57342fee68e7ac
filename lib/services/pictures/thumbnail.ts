import { and, eq } from 'drizzle-orm'
import { read, write } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import { pictures, themeEnum } from '@/db/schema'
import { drawScene, thumbnailSize } from '@/lib/pictures/scene-picture'
import { storedScene } from '../scene-document'
import type { Scene } from '@/scene/model/scene'

type Theme = (typeof themeEnum.enumValues)[number]

/**
 * The kept thumbnail of a version, drawn now if it is not there yet. It lies in the database, where all servers see the
 * same, and weighs some ten kilobytes. Whether it may be seen has been settled before this.
 */
export async function thumbnail(
  sceneId: string,
  version: number,
  theme: Theme,
  document: Scene,
): Promise<Uint8Array<ArrayBuffer>> {
  const [kept] = await read((tx) =>
    tx
      .select({ png: pictures.png })
      .from(pictures)
      .where(and(eq(pictures.sceneId, sceneId), eq(pictures.version, version), eq(pictures.theme, theme))),
  )
  if (kept) return kept.png
  const png = Uint8Array.from(await drawScene(document, theme, thumbnailSize))
  await write((tx) => tx.insert(pictures).values({ sceneId, version, theme, png }).onConflictDoNothing())
  return png
}

/** Draws the thumbnail of a version in both themes, as far as it is not there. */
export async function drawThumbnails(sceneId: string, number: number): Promise<void> {
  const version = await read((tx) => versionOf(tx, sceneId, number))
  if (!version) return
  const document = storedScene(version.document)
  for (const theme of themeEnum.enumValues) await thumbnail(sceneId, number, theme, document)
}
