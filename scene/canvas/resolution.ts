/** Picture sizes that a moving engine may be drawn at: all the device's pixels, then of these classes (STACK.md). */
const classes = [Infinity, 1280 * 720, 960 * 540, 640 * 360]

/** Even a still picture has no more pixels than this: memory is about 24 bytes a pixel. */
const mostPixels = 2560 * 1600

/** A moving picture that takes longer than `slow` is drawn smaller; one that would take less than `fast` a step larger, larger. */
const slow = 14
const fast = 9
/** So many frames are watched before a step is taken. */
const watched = 12

export interface Resolution {
  /** Picture pixels for each CSS pixel, moving or still. */
  scale(width: number, height: number, ratio: number, still: boolean): number
  /** A moving picture of so many pixels was painted, of `all` that the device has: after enough of them a step is taken. */
  add(milliseconds: number, pixels: number, all: number): void
}

export function createResolution(): Resolution {
  let step = 0
  let frames = 0
  let total = 0
  let lastPixels = 0
  const scaleOf = (width: number, height: number, ratio: number, pixels: number) =>
    Math.min(ratio, Math.sqrt(Math.min(mostPixels, pixels) / (width * height)))
  return {
    scale: (width, height, ratio, still) => scaleOf(width, height, ratio, still ? Infinity : classes[step]),
    add(milliseconds, pixels, all) {
      if (pixels !== lastPixels) frames = total = 0
      lastPixels = pixels
      frames++
      total += milliseconds
      if (frames < watched) return
      const mean = total / frames
      frames = total = 0
      if (mean > slow) {
        // Past classes that are no smaller than what is drawn now.
        while (step < classes.length - 1 && classes[step] >= pixels) step++
      } else if (step > 0) {
        if ((mean * Math.min(classes[step - 1], mostPixels, all)) / pixels < fast) step--
      }
    },
  }
}
