/** Dates as the interface says them, in the reader's own time zone. */
const relative = new Intl.RelativeTimeFormat('en', { numeric: 'auto' })
const date = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' })
const moment = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
})

const minute = 60
const hour = 60 * minute
const day = 24 * hour
const week = 7 * day

/** ISO 8601 → "12 Mar 2026, 14:05". */
export function formatMoment(iso: string): string {
  return moment.format(new Date(iso))
}

/** ISO 8601 → "5 minutes ago" within the last week, the date before that. */
export function formatAge(iso: string, now = Date.now()): string {
  const then = new Date(iso)
  const seconds = Math.round((now - then.getTime()) / 1000)
  if (seconds < minute) return 'just now'
  if (seconds < hour) return relative.format(-Math.floor(seconds / minute), 'minute')
  if (seconds < day) return relative.format(-Math.floor(seconds / hour), 'hour')
  if (seconds < week) return relative.format(-Math.floor(seconds / day), 'day')
  return date.format(then)
}
