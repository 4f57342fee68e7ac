/** Height of the title strip as a share of the picture's width. */
const strip = 0.05

const token = (name: string) => getComputedStyle(document.documentElement).getPropertyValue(name).trim()

/** The picture with a strip below it that says what it shows, on the page's own paper. */
export async function titledPicture(picture: Blob, title: string, words: string): Promise<Blob> {
  const image = await createImageBitmap(picture)
  const canvas = document.createElement('canvas')
  const height = Math.round(strip * image.width)
  canvas.width = image.width
  canvas.height = image.height + height
  const pen = canvas.getContext('2d')!
  const [paper, ink, soft] = [token('--paper'), token('--ink'), token('--ink-2')]
  pen.fillStyle = paper
  pen.fillRect(0, 0, canvas.width, canvas.height)
  pen.drawImage(image, 0, 0)
  image.close()
  pen.strokeStyle = ink
  pen.lineWidth = Math.max(1, image.width / 800)
  pen.strokeRect(0, 0, canvas.width, canvas.height)
  pen.beginPath()
  pen.moveTo(0, canvas.height - height)
  pen.lineTo(canvas.width, canvas.height - height)
  pen.stroke()
  const middle = canvas.height - height / 2
  const edge = height / 3
  pen.textBaseline = 'middle'
  pen.fillStyle = soft
  pen.font = `400 ${Math.round(0.3 * height)}px ${fontOf('fig')}`
  pen.textAlign = 'right'
  pen.fillText(words, canvas.width - edge, middle)
  const room = canvas.width - 3 * edge - pen.measureText(words).width
  pen.fillStyle = ink
  pen.font = `600 ${Math.round(0.42 * height)}px ${fontOf('head')}`
  pen.textAlign = 'left'
  pen.fillText(title, edge, middle, room)
  return new Promise((resolve, reject) =>
    canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error('The picture could not be made.')))),
  )
}

/** The face that the page has loaded for a use: the names behind the tokens are known to the page alone. */
function fontOf(use: 'head' | 'fig'): string {
  const probe = document.createElement('span')
  probe.style.fontFamily = `var(--font-${use})`
  document.body.append(probe)
  const { fontFamily } = getComputedStyle(probe)
  probe.remove()
  return fontFamily
}
