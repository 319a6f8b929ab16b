/** Time zone of the browser. */
export function ownTimeZone(): string {
  return new Intl.DateTimeFormat().resolvedOptions().timeZone
}

/** Every zone that the browser knows, and UTC, which some leave out. */
export function timeZones(): readonly string[] {
  return [...new Set(['UTC', ...Intl.supportedValuesOf('timeZone')])]
}
