/**
 * The manner of the drawing, in CSS pixels where it is a length. Every surface has the same
 * two tones, light `metal` and shaded `part`; a crown's are both mixed towards `gas`, a lit part's are the pencil's wash.
 */

/** A face is light where its normal and this direction (right, up, towards the eye; unit) agree by more than `lightFrom`. */
export const light = { right: -0.42, up: 0.76, toEye: 0.496 }
export const lightFrom = 0.42

/** Half widths of ink. */
export const outlineHalf = 0.8
export const insideHalf = 0.55
export const farOutlineHalf = 0.55
export const farInsideHalf = 0.4
export const ghostHalf = 0.4
export const hatchHalf = 0.36

/** How much ink is left on the far bank and on ghosts. */
export const farInk = 0.66
export const ghostInk = 0.62

/** A surface narrower than this on screen gets thinner lines, down to a quarter (an outline: to three quarters). */
export const narrowWidth = 4
export const thinnest = 0.25
export const thinnestOutline = 0.75

/** Runs of ink that stand alone and are shorter than this are flecks; along a narrow surface as much longer as its lines are thinner. */
export const fleckLength = 4.5
/** Gaps in a line up to this long are closed. */
export const gapLength = 2

/** Distance between hatch lines. */
export const hatchPitch = 5.5

/** Own surface this near in depth, as a share of the depth range, shows that a line is not hidden. */
export const depthTolerance = 0.04

/** A lit part's shaded tone is its wash mixed so far towards the pencil. */
export const litShade = 0.14

/** Full pressure leaves this share of the gas colour on a crown. */
export const crownWash = 0.6
