/** The first that matches names it: many browsers also claim to be another. */
const browsers: [RegExp, string][] = [
  [/\bEdgA?\//, 'Edge'],
  [/\b(?:OPR|Opera)\//, 'Opera'],
  [/\b(?:Firefox|FxiOS)\//, 'Firefox'],
  [/\b(?:Chrome|CriOS|Chromium)\//, 'Chrome'],
  [/\bVersion\/.*\bSafari\//, 'Safari'],
]

const systems: [RegExp, string, 'phone' | 'tablet' | 'computer'][] = [
  [/\biPhone\b/, 'iOS', 'phone'],
  [/\biPad\b/, 'iPadOS', 'tablet'],
  [/\bAndroid\b.*\bMobile\b/, 'Android', 'phone'],
  [/\bAndroid\b/, 'Android', 'tablet'],
  [/\bWindows\b/, 'Windows', 'computer'],
  [/\bMac OS X\b/, 'macOS', 'computer'],
  [/\b(?:Linux|X11|CrOS)\b/, 'Linux', 'computer'],
]

/** What somebody would call the thing they were signed in on, from what its browser says of itself. */
export function deviceWords(userAgent: string): string {
  const browser = browsers.find(([pattern]) => pattern.test(userAgent))?.[1]
  const system = systems.find(([pattern]) => pattern.test(userAgent))
  const on = system && `${system[2]} with ${system[1]}`
  if (browser && on) return `${browser}, ${on}`
  if (browser || on) return browser ?? `A ${on}`
  return 'A device that does not say what it is'
}
