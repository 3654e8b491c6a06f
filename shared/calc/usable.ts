/** True when every argument is a finite number: the guard at the head of a calculation that answers null otherwise. */
export const usable = (...numbers: readonly number[]): boolean => numbers.every(Number.isFinite)

/** A result on its way out: the number itself, or null where arithmetic overflowed or met a division by zero. */
export const finite = (value: number): number | null => (Number.isFinite(value) ? value : null)
