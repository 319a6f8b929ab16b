/** Names by which people know their browsers; the first that fits counts, for later ones hide in it. */
const BROWSERS = [
  ['Edge', /\bEdg(?:e|A|iOS)?\//],
  ['Opera', /\bOPR\//],
  ['Firefox', /\b(?:Firefox|FxiOS)\//],
  ['Chrome', /\b(?:Chrome|CriOS|Chromium|HeadlessChrome)\//],
  ['Safari', /\bSafari\//],
] as const

const SYSTEMS = [
  ['Android', /\bAndroid\b/],
  ['iPhone', /\biPhone\b/],
  ['iPad', /\biPad\b/],
  ['Windows', /\bWindows\b/],
  ['macOS', /\bMac OS X\b/],
  ['Linux', /\bLinux\b/],
] as const

export interface Device {
  readonly browser: string
  readonly system: string
}

/** Browser and system that a session was opened with; null where the text tells neither. */
export function deviceOf(userAgent: string): Device | null {
  const browser = BROWSERS.find(([, pattern]) => pattern.test(userAgent))?.[0]
  const system = SYSTEMS.find(([, pattern]) => pattern.test(userAgent))?.[0]
  return browser && system ? { browser, system } : null
}
