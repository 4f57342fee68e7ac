import type { Block, Letter } from './letter'
import { offWords } from './off-words'

const entities: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}
export const escapeHtml = (text: string) => text.replace(/[&<>"']/g, (sign) => entities[sign])

const lines = (text: string) => escapeHtml(text).replaceAll('\n', '<br>')
const anchor = (url: string, label: string) => `<a href="${escapeHtml(url)}">${escapeHtml(label)}</a>`

function blockHtml(block: Block): string {
  if (block.is === 'link') return `<p>${anchor(block.url, block.label)}</p>`
  if (block.is === 'quote') {
    return `<blockquote style="margin:0 0 1em;padding:0 0 0 12px;border-left:2px solid currentColor">${lines(block.text)}</blockquote>`
  }
  return `<p>${lines(block.text)}</p>`
}

/** No colours of its own and nothing fetched: it reads in light and dark, and opening it tells nobody. */
export function letterHtml({ subject, greeting, blocks, because }: Letter, offUrl: string | null): string {
  const body = [
    ...(greeting ? [`<p>${escapeHtml(greeting)},</p>`] : []),
    ...blocks.map(blockHtml),
    `<hr style="border:0;border-top:1px solid currentColor">`,
    `<p><small>${lines(because)}${offUrl ? ` ${anchor(offUrl, offWords)}` : ''}</small></p>`,
  ]
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<meta name="color-scheme" content="light dark">
<title>${escapeHtml(subject)}</title>
</head>
<body style="margin:0;padding:16px">
<div style="max-width:560px;font:16px/1.5 Georgia,serif">
${body.join('\n')}
</div>
</body>
</html>
`
}
