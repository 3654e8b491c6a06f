import { finite, usable } from '../usable.ts'

export interface LadderSection {
  /** Loop resistance of this leg of the line, ohm. */
  readonly loopOhm: number
  /** Impedance of what hangs at its end, ohm; null: nothing, a splice. */
  readonly loadOhm: number | null
}

export interface LadderAnswer {
  /** Impedance that the amplifier sees, line included, ohm. */
  readonly inputOhm: number
  /** Level at each section's end against the amplifier, dB lost. */
  readonly lossDb: readonly number[]
}

/**
 * A line of hops with a load at the end of each: exact ladder of constant impedances, worked back from the far end.
 * Null for no section, a negative resistance, or no load at all.
 */
export function speakerLadder(sections: readonly LadderSection[]): LadderAnswer | null {
  if (!sections.length || !sections.every(isPossible)) return null
  // Admittance seen at each node, from the far end back to the amplifier.
  const at: number[] = new Array<number>(sections.length).fill(0)
  for (let i = sections.length - 1; i >= 0; i--) {
    const onward = i + 1 < sections.length ? 1 / (sections[i + 1]!.loopOhm + 1 / at[i + 1]!) : 0
    const { loadOhm } = sections[i]!
    at[i] = (loadOhm === null ? 0 : 1 / loadOhm) + (Number.isFinite(onward) ? onward : 0)
  }
  if (at[0] === 0) return null
  let level = 1
  const lossDb = sections.map(({ loopOhm }, i) => {
    const node = at[i]! > 0 ? 1 / at[i]! : Infinity
    level *= Number.isFinite(node) ? node / (node + loopOhm) : 1
    return -20 * Math.log10(level)
  })
  const inputOhm = finite(sections[0]!.loopOhm + 1 / at[0]!)
  return inputOhm === null || lossDb.some((loss) => !Number.isFinite(loss)) ? null : { inputOhm, lossDb }
}

const isPossible = ({ loopOhm, loadOhm }: LadderSection) =>
  usable(loopOhm) && loopOhm >= 0 && (loadOhm === null || (usable(loadOhm) && loadOhm > 0))
