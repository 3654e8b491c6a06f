/**
 * The format of a source that feeds several displays at once without scaling: the lowest of what each accepts at most.
 * `order` lists formats from the least. Null: no display, or a format that the list does not have.
 * Common practice, no source.
 */
export function sharedFormat(sinkMaxima: readonly string[], order: readonly string[]): string | null {
  const places = sinkMaxima.map((format) => order.indexOf(format))
  if (places.length === 0 || places.includes(-1)) return null
  return order[Math.min(...places)] ?? null
}

/**
 * The same where each display has its own list, such as colour depths or copy-protection versions: the highest that
 * all accept. Null: no display, or nothing in common, in which case the source must not be shared. Common practice, no
 * source.
 */
export function highestCommon(sinks: readonly (readonly string[])[], order: readonly string[]): string | null {
  if (sinks.length === 0) return null
  return order.findLast((format) => sinks.every((accepted) => accepted.includes(format))) ?? null
}
