import type { JobDocument } from './jobDocument.ts'
import type { Strike, StruckKind } from './fieldRecord.ts'

/** Strikes by what they strike, remembered by the identity of the map they were read from. */
const seen = new WeakMap<ReadonlyMap<string, Strike>, ReadonlyMap<string, readonly Strike[]>>()

function strikesByTarget(strikes: ReadonlyMap<string, Strike>): ReadonlyMap<string, readonly Strike[]> {
  let byTarget = seen.get(strikes)
  if (!byTarget) {
    const grouped = new Map<string, Strike[]>()
    for (const strike of strikes.values()) {
      const key = `${strike.targetKind}:${strike.targetId}`
      grouped.set(key, [...(grouped.get(key) ?? []), strike])
    }
    seen.set(strikes, (byTarget = grouped))
  }
  return byTarget
}

/** Whether a field record was struck out, by a strike that itself still stands. */
export function isStruck(doc: JobDocument, kind: StruckKind, id: string): boolean {
  const strikes = strikesByTarget(doc.records.strike).get(`${kind}:${id}`)
  return strikes?.some((strike) => !isStruck(doc, 'strike', strike.id)) ?? false
}
