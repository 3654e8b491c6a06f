const dayMs = 86_400_000
const startOfDay = (at: Date) => new Date(at.getFullYear(), at.getMonth(), at.getDate()).getTime()

/** Whole days between two moments by the calendar of whoever looks: 0 is today. */
export const daysSince = (at: Date, now: Date): number => Math.round((startOfDay(now) - startOfDay(at)) / dayMs)

/** When something was last heard, as it is said: "10:42 AM today", "4:10 PM yesterday", "May 15", "May 15, 2025". */
export function heardText(at: Date, now: Date): string {
  const days = daysSince(at, now)
  const time = at.toLocaleTimeString('en-US', { hour: 'numeric', minute: '2-digit' })
  if (days <= 0) return `${time} today`
  if (days === 1) return `${time} yesterday`
  const year = at.getFullYear() === now.getFullYear() ? {} : { year: 'numeric' as const }
  return at.toLocaleDateString('en-US', { month: 'short', day: 'numeric', ...year })
}
