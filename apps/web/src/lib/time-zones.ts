/** Zone of this device, as the IANA list names it. */
export function deviceTimeZone(): string {
  return Intl.DateTimeFormat().resolvedOptions().timeZone || 'UTC';
}

/** All zones the browser knows, with the device's own and UTC in any case. */
export function timeZones(): readonly string[] {
  return [...new Set(['UTC', deviceTimeZone(), ...Intl.supportedValuesOf('timeZone')])].sort();
}
