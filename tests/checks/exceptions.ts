/** Rows that were shown to be wrong, with what is right and the proof. Empty: none was. */
export const exceptions: ReadonlyMap<string, { expected: unknown; reason: string }> = new Map()
