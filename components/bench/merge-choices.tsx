'use client'

import type { System } from '@/lib/units/quantities'
import { asShown, placeInWords, quantityOf, valueOf } from '@/scene/model/change-words'
import type { Choice, Choices, Conflict } from '@/scene/model/merge-scenes'
import type { Scene } from '@/scene/model/scene'

interface Props {
  conflicts: readonly Conflict[]
  choices: Choices
  /** The version that was saved in between. */
  head: number
  scenes: { base: Scene; theirs: Scene; mine: Scene }
  system: System
  onChoose(choices: Choices): void
}

/** Every value that both have changed, and whose of the two is kept. */
export function MergeChoices({ conflicts, choices, head, scenes, system, onChoose }: Props) {
  const all = (choice: Choice) => onChoose(Object.fromEntries(conflicts.map(({ key }) => [key, choice])))
  return (
    <section className="merge-both" aria-label="Changed in both">
      <h3>Changed in both: whose value is kept?</h3>
      {conflicts.length > 1 ? (
        <p className="row">
          <button type="button" className="btn sm" onClick={() => all('mine')}>
            Mine in all
          </button>
          <button type="button" className="btn sm" onClick={() => all('theirs')}>
            Version {head} in all
          </button>
        </p>
      ) : null}
      {conflicts.map((conflict) => {
        const { key, path } = conflict
        const name = placeInWords(path, scenes.base, scenes.mine)
        const texts = textsOf(conflict, system)
        const option = (choice: Choice, of: string) => (
          <label className={choices[key] === choice ? 'vo on' : 'vo'}>
            <input
              type="radio"
              name={key}
              checked={choices[key] === choice}
              onChange={() => onChoose({ ...choices, [key]: choice })}
            />
            <span>
              <b>{of}</b>
              <small>{texts[choice]}</small>
            </span>
          </label>
        )
        return (
          <fieldset key={key}>
            <legend>
              {name} <span className="cap">was {texts.base}</span>
            </legend>
            <div className="vopts">
              {option('mine', 'Mine')}
              {option('theirs', `Version ${head}`)}
            </div>
          </fieldset>
        )
      })}
    </section>
  )
}

function textsOf({ path, base, theirs, mine }: Conflict, system: System) {
  if (path[0] === 'view' && path.length === 1)
    return {
      base: 'otherwise',
      mine: 'my camera, angle and overlays',
      theirs: 'its camera, angle and overlays',
    }
  const figure = [base, theirs, mine].some((value) => typeof value === 'number') ? quantityOf(path) : null
  const text = (value: unknown) => {
    if (value === undefined) return 'none'
    const now = valueOf(value, figure?.unit ?? null)
    const shown = asShown({ quantity: figure?.quantity ?? null, was: null, now }, system)
    return `${shown.now}${shown.unit && ` ${shown.unit}`}`
  }
  return { base: text(base), mine: text(mine), theirs: text(theirs) }
}
