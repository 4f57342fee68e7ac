import type { Block, Letter } from './letter'
import { offWords } from './off-words'

function blockText(block: Block): string {
  if (block.is === 'link') return `${block.label}:\n${block.url}`
  if (block.is === 'quote')
    return block.text
      .split('\n')
      .map((line) => `> ${line}`.trimEnd())
      .join('\n')
  return block.text
}

export function letterText({ greeting, blocks, because }: Letter, offUrl: string | null): string {
  return [
    ...(greeting ? [`${greeting},`] : []),
    ...blocks.map(blockText),
    // the mark that mail programs know what follows as a signature by
    `-- \n${because}`,
    ...(offUrl ? [`${offWords}:\n${offUrl}`] : []),
    '',
  ]
    .join('\n\n')
    .trimEnd()
    .concat('\n')
}
