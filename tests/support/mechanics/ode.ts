/**
 * dy/dx = f(x, y) from x0 to x1 by the Dormand–Prince pair of orders 5 and 4 with step control
 * (J. R. Dormand, P. J. Prince, J. Comp. Appl. Math. 6, 1980). `f` must be smooth on the way.
 */
export function integrated(
  f: (x: number, y: number) => number,
  x0: number,
  y0: number,
  x1: number,
  relative = 1e-12,
) {
  let [x, y, h] = [x0, y0, (x1 - x0) / 4]
  const least = (x1 - x0) * 1e-12
  while (x < x1) {
    h = Math.min(h, x1 - x)
    const k1 = f(x, y)
    const k2 = f(x + h / 5, y + (h * k1) / 5)
    const k3 = f(x + (3 * h) / 10, y + h * ((3 * k1) / 40 + (9 * k2) / 40))
    const k4 = f(x + (4 * h) / 5, y + h * ((44 * k1) / 45 - (56 * k2) / 15 + (32 * k3) / 9))
    const k5 = f(
      x + (8 * h) / 9,
      y + h * ((19372 * k1) / 6561 - (25360 * k2) / 2187 + (64448 * k3) / 6561 - (212 * k4) / 729),
    )
    const k6 = f(
      x + h,
      y +
        h *
          ((9017 * k1) / 3168 -
            (355 * k2) / 33 +
            (46732 * k3) / 5247 +
            (49 * k4) / 176 -
            (5103 * k5) / 18656),
    )
    const next =
      y + h * ((35 * k1) / 384 + (500 * k3) / 1113 + (125 * k4) / 192 - (2187 * k5) / 6784 + (11 * k6) / 84)
    const k7 = f(x + h, next)
    const error = Math.abs(
      h *
        ((71 * k1) / 57600 -
          (71 * k3) / 16695 +
          (71 * k4) / 1920 -
          (17253 * k5) / 339200 +
          (22 * k6) / 525 -
          k7 / 40),
    )
    const allowed = relative * Math.abs(y)
    if (error <= allowed || h <= least) {
      x = h >= x1 - x ? x1 : x + h
      y = next
    }
    h *= Math.min(4, Math.max(0.2, 0.9 * (allowed / (error + 1e-300)) ** 0.2))
  }
  return y
}
