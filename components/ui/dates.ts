/** A moment as a date in the person's zone: 1 Dec 2026. */
export function formatDate(moment: string, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { timeZone: zone, day: 'numeric', month: 'short', year: 'numeric' }).format(
    new Date(moment),
  )
}

/** A moment with its time: 1 Dec 2026, 14:05. */
export function formatMoment(moment: string, zone: string): string {
  const time = new Intl.DateTimeFormat('en-GB', { timeZone: zone, hour: '2-digit', minute: '2-digit' }).format(new Date(moment))
  return `${formatDate(moment, zone)}, ${time}`
}
