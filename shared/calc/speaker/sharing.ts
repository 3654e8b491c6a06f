import { usable } from '../usable.ts'
import { parallelOhm, seriesOhm } from './load.ts'

/**
 * Watts into each of several loads in parallel on a source: V²/Zi. True only while the loads together are not below
 * what the amplifier may drive. Null for none, a load of nothing, or a negative voltage.
 */
export function parallelSharesW(sourceV: number, loadsOhm: readonly number[]): number[] | null {
  if (!usable(sourceV) || sourceV < 0 || parallelOhm(loadsOhm) === null) return null
  return whole(loadsOhm.map((load) => sourceV ** 2 / load))
}

/** Watts into each of several loads in series on a source: (V/sum of Z)² Zi. Null as in parallel. */
export function seriesSharesW(sourceV: number, loadsOhm: readonly number[]): number[] | null {
  const sum = seriesOhm(loadsOhm)
  if (!usable(sourceV) || sourceV < 0 || sum === null) return null
  return whole(loadsOhm.map((load) => (sourceV / sum) ** 2 * load))
}

/** Impedance of strings of loads in series, the strings in parallel, ohm. Null for no string, or an impossible one. */
export function seriesParallelOhm(strings: readonly (readonly number[])[]): number | null {
  const sums: number[] = []
  for (const loads of strings) {
    const sum = seriesOhm(loads)
    if (sum === null) return null
    sums.push(sum)
  }
  return parallelOhm(sums)
}

const whole = (shares: number[]) => (usable(...shares) ? shares : null)
