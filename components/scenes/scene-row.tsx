import Link from 'next/link'
import type { SceneSummary } from '@/lib/contracts/scenes'
import { stateWords } from '@/lib/review/version-states'
import { Thumbnail } from './thumbnail'

export type SceneAct = 'rename' | 'duplicate' | 'archive' | 'restore'

interface Props {
  scene: SceneSummary
  number: number
  acts: SceneAct[]
  onAct(act: SceneAct, scene: SceneSummary): void
}

const words: Record<SceneAct, string> = {
  rename: 'Rename…',
  duplicate: 'Duplicate',
  archive: 'Archive',
  restore: 'Restore',
}

const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' })
const litres = (cc: number) =>
  (cc / 1000).toLocaleString('en-US', { minimumFractionDigits: 3, maximumFractionDigits: 3 })

/** One line of the drawing register. */
export function SceneRow({ scene, number, acts, onAct }: Props) {
  return (
    <tr>
      <td className="fig no2">{String(number).padStart(2, '0')}</td>
      <td className="th">
        <Thumbnail src={scene.thumbnailUrl} />
      </td>
      <th scope="row">
        <Link href={`/bench?scene=${scene.id}`}>{scene.title}</Link>
        <span className="cap">
          {scene.layout}
          {scene.message ? `, ${scene.message}` : ''}
        </span>
      </th>
      <td className="fire2">{scene.firing}</td>
      <td className="n disp">
        {litres(scene.displacementCc)}
        <span className="u"> L</span>
      </td>
      <td className="n ver">
        <Link href={`/scenes/${scene.id}/versions`} prefetch={false} title="All versions">
          <span className="vh">version </span>
          {scene.headVersion}
        </Link>
        <Link className="cap" href={`/scenes/${scene.id}/review`}>
          {stateWords[scene.state]}
          <span className="vh">, review of {scene.title}</span>
        </Link>
      </td>
      <td className="who2">
        {scene.savedBy}
        <span className="cap">{day.format(new Date(scene.savedAt))}</span>
      </td>
      <td className="row-acts">
        {acts.map((act) => (
          <button key={act} type="button" className="btn txt sm" onClick={() => onAct(act, scene)}>
            {words[act]}
            <span className="vh"> {scene.title}</span>
          </button>
        ))}
      </td>
    </tr>
  )
}
