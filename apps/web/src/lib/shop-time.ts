/** The instant of a wall clock in a zone, "2026-05-14T07:40" in "Europe/London" → "2026-05-14T06:40:00.000Z"; undefined for no such time. */
export function instantInZone(wallTime: string, timeZone: string): string | undefined {
  const asUtcMs = Date.parse(`${wallTime}Z`);
  if (Number.isNaN(asUtcMs)) return undefined;
  // The offset at the guess may be that of the other side of a change of the clock, so the second pass takes it at the answer.
  const guessMs = asUtcMs - offsetMs(asUtcMs, timeZone);
  return new Date(asUtcMs - offsetMs(guessMs, timeZone)).toISOString();
}

/** How far the zone's clock is ahead of UTC at an instant. */
function offsetMs(atMs: number, timeZone: string): number {
  const parts = new Intl.DateTimeFormat('en-GB', {
    ...{ timeZone, year: 'numeric', month: '2-digit', day: '2-digit', hour: '2-digit', minute: '2-digit', second: '2-digit' },
    hourCycle: 'h23',
  }).formatToParts(atMs);
  const value = (type: Intl.DateTimeFormatPartTypes) => Number(parts.find((part) => part.type === type)?.value);
  const shownMs = Date.UTC(value('year'), value('month') - 1, value('day'), value('hour'), value('minute'), value('second'));
  return shownMs - Math.floor(atMs / 1000) * 1000;
}

/** The day on a zone's calendar, "2026-05-14". */
export function dayInZone(at: Date, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' }).formatToParts(at);
  const value = (type: Intl.DateTimeFormatPartTypes) => parts.find((part) => part.type === type)?.value ?? '';
  return `${value('year')}-${value('month')}-${value('day')}`;
}
