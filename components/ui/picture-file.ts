/** What of an element's style a file must carry with it, since it leaves the sheet's rules behind. */
const carried = [
  ...[
    'fill',
    'fill-opacity',
    'stroke',
    'stroke-width',
    'stroke-dasharray',
    'stroke-linecap',
    'stroke-linejoin',
  ],
  ...[
    'font-family',
    'font-size',
    'font-weight',
    'font-stretch',
    'text-anchor',
    'opacity',
    'paint-order',
    'display',
  ],
]

const escaped = (text: string) => text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;')

/** A chart as an SVG file of its own: styles written into it, what is live left out, title and stamp in its metadata. */
export function svgText(svg: SVGSVGElement, stamp: Record<string, string>): string {
  const copy = svg.cloneNode(true) as SVGSVGElement
  const from = [svg, ...svg.querySelectorAll<SVGElement>('*')]
  const to = [copy, ...copy.querySelectorAll<SVGElement>('*')]
  from.forEach((element, i) => {
    const style = getComputedStyle(element)
    to[i].setAttribute('style', carried.map((name) => `${name}:${style.getPropertyValue(name)}`).join(';'))
    to[i].removeAttribute('class')
  })
  for (const element of copy.querySelectorAll('[data-live]')) element.remove()
  copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg')
  const paper = getComputedStyle(document.documentElement).getPropertyValue('--paper')
  const { title, ...rest } = stamp
  const lines = Object.entries(rest).map(([name, words]) => `${name}: ${words}`)
  copy.insertAdjacentHTML(
    'afterbegin',
    `<title>${escaped(title)}</title><desc>${escaped(lines.join('; '))}</desc><rect width="100%" height="100%" fill="${paper}"/>`,
  )
  return new XMLSerializer().serializeToString(copy)
}

/** Drawn at this many times its size on the screen: enough for print at its width there. */
const PRINT = 3

/** The same as a PNG picture. */
export async function pngOf(svg: SVGSVGElement, text: string): Promise<Blob> {
  const picture = new Image()
  picture.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(text)}`
  await picture.decode()
  const canvas = document.createElement('canvas')
  canvas.width = svg.width.baseVal.value * PRINT
  canvas.height = svg.height.baseVal.value * PRINT
  canvas.getContext('2d')!.drawImage(picture, 0, 0, canvas.width, canvas.height)
  return new Promise((resolve, reject) =>
    canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error('The picture could not be made.')))),
  )
}
