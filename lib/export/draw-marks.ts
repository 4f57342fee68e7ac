import type { Drawing } from '@/lib/sheet/marks'
import { inks } from './inks'
import type { Typesetter } from './typesetter'

/** A drawing scaled into a box, as large as fits, in its middle. */
export function drawMarks(
  type: Typesetter,
  { marks, width, height }: Drawing,
  box: { x: number; y: number; width: number; height: number },
): void {
  const { pdf } = type
  const scale = Math.min(box.width / width, box.height / height)
  pdf.save()
  pdf.translate(box.x + (box.width - scale * width) / 2, box.y + (box.height - scale * height) / 2)
  pdf.scale(scale)
  for (const mark of marks) {
    if (mark.kind === 'text') {
      type.line(mark.text, mark.x, mark.y, { face: 'figure', size: mark.size, colour: inks.ink }, mark.anchor)
      continue
    }
    pdf.lineWidth(mark.weight).strokeColor(inks.ink)
    if (mark.dash) pdf.dash(mark.dash[0], { space: mark.dash[1] })
    else pdf.undash()
    pdf.path(mark.d)
    if (mark.fill) pdf.fillAndStroke(mark.fill === 'ink' ? inks.ink : inks.paper, inks.ink)
    else pdf.stroke()
  }
  pdf.undash()
  pdf.restore()
}
