'use client'

import type { SheetContent } from '@/lib/sheet/sheet-content'
import type { Paper } from '@/lib/sheet/sheet-parts'
import type { Scene } from '@/scene/model/scene'
import { MarksSvg } from './marks-svg'
import { usePicture } from './use-picture'

interface Props {
  content: SheetContent
  scene: Scene
  paper: Paper
}

/** The first sheet as it will be printed, and what follows on the others. Paper is white whatever the theme. */
export function SheetPreview({ content, scene, paper }: Props) {
  const { address, missing } = usePicture(scene, content.drawn)
  const { stamp, star, strip, groups, completeness } = content
  const main = groups.flatMap(({ tables }) => tables).find(({ title }) => title === 'Main data')
  const counts = completeness && tally(completeness.map(({ standing }) => standing))
  return (
    <div className="paper-preview">
      <figure className={`paper-sheet ${paper.toLowerCase()}`} aria-label={`First sheet on ${paper}`}>
        <div className="paper-picture">
          {content.drawn ? (
            address ? (
              <img src={address} alt={content.pictureWords} />
            ) : (
              <p>
                {missing ? 'The picture could not be fetched for the preview.' : 'Setting out the drawing'}
              </p>
            )
          ) : (
            <p>Without the drawing</p>
          )}
        </div>
        <div className="paper-side">
          <MarksSvg drawing={star} className="paper-star" />
          {main ? (
            <dl className="paper-main">
              {main.rows.map(([name, ...figures]) => (
                <div key={name}>
                  <dt>{name}</dt>
                  <dd>{figures[0]}</dd>
                </div>
              ))}
            </dl>
          ) : null}
        </div>
        <MarksSvg drawing={strip} className="paper-strip" />
        <div className="paper-block">
          <b>{stamp.title}</b>
          <span>{content.sentence}</span>
          <span className="fig">
            {stamp.sceneId
              ? `Version ${stamp.version}${stamp.changed ? ', changed since' : ''}`
              : 'Not saved'}
            ; {content.condition}
          </span>
        </div>
      </figure>
      <div className="paper-follows">
        <h4>On the sheets after it</h4>
        <ul>
          {groups.map(({ title, tables }) => (
            <li key={title}>
              <b>{title}</b>: {tablesInWords(tables.map((table) => table.title))}
            </li>
          ))}
          {counts ? (
            <li>
              <b>What a class society asks for</b>: {counts}
            </li>
          ) : null}
          <li>
            <b>What the figures assume</b>: {content.method}; {content.assumptions.length} statements
          </li>
          <li>
            <b>Cautions</b>: {content.cautions.length}, on every print
          </li>
        </ul>
        {completeness ? (
          <details>
            <summary>What is missing or there in part</summary>
            <ul>
              {completeness
                .filter(({ standing }) => standing !== 'present')
                .map(({ item, standing, found }) => (
                  <li key={item}>
                    <b>{standing}</b> {item}: {found}
                  </li>
                ))}
            </ul>
          </details>
        ) : null}
      </div>
    </div>
  )
}

/** Each once, whatever its units; the one beside the drawing is not on the sheets after it. */
const tablesInWords = (titles: string[]) =>
  [...new Set(titles.map((title) => title.replace(/, (SI|US)$/, '')))]
    .filter((title) => title !== 'Main data')
    .map((title) => title[0].toLowerCase() + title.slice(1))
    .join('; ')

const tally = (standings: string[]) =>
  ['present', 'in part', 'missing']
    .map((word) => `${standings.filter((standing) => standing === word).length} ${word}`)
    .join(', ')
