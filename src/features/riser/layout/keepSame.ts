/**
 * The next value with every part that is equal to the one before kept as it was, so that whoever compares by identity
 * sees only what has changed. Looks into plain objects, arrays and no deeper than where identity already holds.
 */
export function keepSame<T>(before: T | undefined, next: T): T {
  return same(before, next) as T
}

function same(before: unknown, next: unknown): unknown {
  if (before === next || typeof before !== 'object' || typeof next !== 'object' || before === null || next === null) return next
  if (Array.isArray(before) !== Array.isArray(next)) return next
  return Array.isArray(next) ? sameArray(before as readonly unknown[], next) : sameObject(before as Record<string, unknown>, next as Record<string, unknown>)
}

function sameArray(before: readonly unknown[], next: readonly unknown[]): readonly unknown[] {
  let isSame = before.length === next.length
  const kept = next.map((each, index) => {
    const one = same(before[index], each)
    if (one !== before[index]) isSame = false
    return one
  })
  return isSame ? before : kept
}

function sameObject(before: Record<string, unknown>, next: Record<string, unknown>): Record<string, unknown> {
  const keys = Object.keys(next)
  let isSame = Object.keys(before).length === keys.length
  const kept: Record<string, unknown> = {}
  for (const key of keys) {
    kept[key] = same(before[key], next[key])
    if (kept[key] !== before[key]) isSame = false
  }
  return isSame ? before : kept
}
