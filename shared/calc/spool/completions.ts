/** One way to fill a spool: how many of each size, by place in the stock's sizes, and their sum. */
export interface Filling {
  taken: readonly (readonly [place: number, count: number])[]
  sum: number
}

export interface CompletionAsk {
  sizes: readonly number[]
  /** What is left of each size, the first piece already taken away. */
  counts: readonly number[]
  room: number
  /** Least sum that keeps the waste within what may still be wasted. */
  least: number
  /** Most fillings to look at, and most steps of the search for them. */
  most: number
  steps: number
}

export interface Completions {
  fillings: Filling[]
  /** Whether some were left out, so that nothing is proved by them. */
  isCut: boolean
  /** Steps that the search took. */
  steps: number
}

/**
 * Fillings for the rest of a spool, fullest first: maximal ones only, and none that another is better than piece by
 * piece. That loses no solution (dominance: Martello and Toth 1990).
 */
export function completions({ sizes, counts, room, least, most, steps }: CompletionAsk): Completions {
  const found: Filling[] = []
  let isCut = false
  let step = 0
  const chosen: [number, number][] = []
  const reach = reachFrom(sizes, counts)

  function from(place: number, left: number, sum: number) {
    if (found.length >= most || ++step > steps) {
      isCut = true
      return
    }
    if (sum + Math.min(left, reach[place] ?? 0) < least) return
    const size = sizes[place]
    if (size === undefined) {
      if (isMaximal(sizes, counts, chosen, left)) found.push({ taken: chosen.map(([at, count]) => [at, count]), sum })
      return
    }
    for (let count = Math.min(counts[place] ?? 0, Math.floor(left / size)); count >= 0; count--) {
      if (count > 0) chosen.push([place, count])
      from(place + 1, left - count * size, sum + count * size)
      if (count > 0) chosen.pop()
    }
  }
  from(0, room, 0)
  found.sort((a, b) => b.sum - a.sum)
  return { fillings: undominated(found), isCut, steps: step }
}

/** All that is left from each place on. */
function reachFrom(sizes: readonly number[], counts: readonly number[]): number[] {
  const reach = Array.from<number>({ length: sizes.length + 1 }).fill(0)
  for (let place = sizes.length - 1; place >= 0; place--) {
    reach[place] = (reach[place + 1] ?? 0) + (sizes[place] ?? 0) * (counts[place] ?? 0)
  }
  return reach
}

/** Whether nothing that is left over would still fit. */
function isMaximal(
  sizes: readonly number[],
  counts: readonly number[],
  chosen: readonly (readonly [number, number])[],
  left: number,
): boolean {
  for (let place = sizes.length - 1; place >= 0; place--) {
    if ((sizes[place] ?? 0) > left) return true
    const taken = chosen.find(([at]) => at === place)?.[1] ?? 0
    if ((counts[place] ?? 0) > taken) return false
  }
  return true
}

const mostCompared = 400

function undominated(found: Filling[]): Filling[] {
  if (found.length > mostCompared) return found
  const places = found.map(({ taken }) =>
    taken.flatMap(([place, count]) => Array.from<number>({ length: count }).fill(place)),
  )
  return found.filter((_, one) => !places.some((other, two) => two < one && isBetter(other, places[one] ?? [])))
}

/**
 * Whether every piece of a worse filling can be swapped for a piece at least as long (a smaller place) of the better.
 */
function isBetter(better: readonly number[], worse: readonly number[]): boolean {
  return better.length >= worse.length && worse.every((place, at) => (better[at] ?? Infinity) <= place)
}
