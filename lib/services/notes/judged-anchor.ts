import { refused } from '@/lib/errors/problem'
import { anchorIssues, pinnables, type Pinnable } from '@/scene/frame/anchor-issues'
import { buildRig } from '@/scene/frame/build-rig'
import type { Anchor } from '@/scene/model/anchor'
import type { Scene } from '@/scene/model/scene'
import { toTrain } from '@/scene/model/to-train'
import { under } from '../scene-document'

const known = new WeakMap<Scene, Pinnable[]>()

function pinnablesOf(scene: Scene): Pinnable[] {
  const parts = known.get(scene) ?? pinnables(buildRig(scene.train, toTrain(scene.train)))
  known.set(scene, parts)
  return parts
}

/** The pinned part in words, or a refusal: the version is not there, or nothing of it is where the anchor says. */
export function judgedAnchor(anchor: Anchor, scene: Scene | undefined): string {
  if (!scene) {
    const message = `There is no version ${anchor.version} of this scene.`
    throw refused([
      {
        path: 'anchor.version',
        code: 'unknown-version',
        message,
        fix: 'Give the version that it was seen in.',
      },
    ])
  }
  const parts = pinnablesOf(scene)
  const issues = anchorIssues(anchor, parts, scene.train)
  if (issues.length > 0) throw refused(under('anchor', issues))
  return parts.find(({ id }) => id === anchor.partId)!.label
}
