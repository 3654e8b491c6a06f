/** One figure beside another, taken in the same run on the same machine: only the ratio says something. */
export interface Row {
  readonly name: string
  readonly ours: number
  readonly reference: number
  readonly ratio: number
  readonly unit: string
  /** Growth with size: the slope of log time over log size. */
  readonly exponent?: number
}

export const row = (name: string, ours: number, reference: number, unit: string, exponent?: number): Row => ({ name, ours, reference, ratio: ours / reference, unit, ...(exponent === undefined ? {} : { exponent }) })

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b)
  const middle = sorted.length >> 1
  return sorted.length % 2 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2
}

/** Median time of some work, ms, after one run that does not count. */
export async function timed(times: number, work: () => unknown): Promise<number> {
  await work()
  const taken: number[] = []
  for (let i = 0; i < times; i++) {
    const start = performance.now()
    await work()
    taken.push(performance.now() - start)
  }
  return median(taken)
}

/** Median times of two works done in turn, so that a machine that slows down slows both. */
export async function paired(times: number, ours: () => unknown, reference: () => unknown): Promise<[number, number]> {
  await ours()
  await reference()
  const [a, b]: [number[], number[]] = [[], []]
  for (let i = 0; i < times; i++) {
    let start = performance.now()
    await ours()
    a.push(performance.now() - start)
    start = performance.now()
    await reference()
    b.push(performance.now() - start)
  }
  return [median(a), median(b)]
}

/** Least-squares slope of log y over log x. */
export function growthExponent(points: readonly (readonly [size: number, time: number])[]): number {
  const logs = points.map(([x, y]) => [Math.log(x), Math.log(y)] as const)
  const mean = (pick: 0 | 1) => logs.reduce((sum, each) => sum + each[pick], 0) / logs.length
  const [mx, my] = [mean(0), mean(1)]
  return logs.reduce((sum, [x, y]) => sum + (x - mx) * (y - my), 0) / logs.reduce((sum, [x]) => sum + (x - mx) ** 2, 0)
}
