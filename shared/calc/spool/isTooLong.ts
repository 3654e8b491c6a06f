/** Whether a run is longer than what it would be cut from; runs may not be spliced. Null: a value that is no number. */
export function isTooLong(lengthMm: number, putUpMm: number): boolean | null {
  return Number.isFinite(lengthMm) && Number.isFinite(putUpMm) && lengthMm >= 0 && putUpMm >= 0
    ? lengthMm > putUpMm
    : null
}
