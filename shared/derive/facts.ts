import type { Finding } from '../checks/finding.ts'
import type { EndName, Run } from '../model/run.ts'

/** The stage of a run follows from its records; nobody sets it. */
export const stages = ['planned', 'pulled', 'one end on', 'terminated', 'tested'] as const
export type Stage = (typeof stages)[number]

/** How a statement about a wire is known. */
export type HowKnown = 'drawn' | 'stated' | 'pulled' | 'tested' | 'guess'

/** What a length is made of, mm. The total is what every check uses. */
export interface LengthMakeUp {
  readonly basis: 'drawn' | 'stated' | 'pulled'
  readonly totalMm: number
  /** The drawn parts, also where another basis gives the total; null where the drawing does not say enough. */
  readonly drawn: {
    readonly riseMm: number
    readonly alongMm: number
    readonly dropMm: number
    readonly slackAMm: number
    readonly slackBMm: number
    readonly totalMm: number
    /** The chases it passes, in order. */
    readonly pathwayIds: readonly string[]
    /** Where it goes, in words, end a first. */
    readonly way: readonly string[]
  } | null
}

/** A length, or a sentence that says what is missing. */
export type RunLength = { readonly length: LengthMakeUp; readonly missing: null } | { readonly length: null; readonly missing: string }

/** One loss in four figures, each of which is called loss somewhere. */
export interface LossFigures {
  readonly lossDb: number
  /** Loop resistance as a share of the load, percent. */
  readonly impedancePercent: number
  readonly voltagePercent: number
  readonly powerPercent: number
}

/** What the amplifier sees on a loudspeaker run, and what the run itself loses into that load. */
export interface SpeakerFacts extends LossFigures {
  readonly loadOhm: number
  /** How the load came about: "two 8 ohm speakers in parallel". */
  readonly loadText: string
  /** Line voltage where it is a constant-voltage line, V; null: low impedance. */
  readonly lineVoltageV: number | null
  /** No cord is drawn to some speaker: it is taken to be on this run because it stands at the plate. */
  readonly assumed: boolean
  readonly loopResistanceOhm: number
  /** Impedance behind the run's end, legs after it included, ohm. */
  readonly behindOhm: number
  /** Level at the run's end against that at the speaker that gets least: 1 where no leg comes after. */
  readonly onwardFactor: number
  /** Labels of legs after it whose length is not known, so that they are left out. */
  readonly uncounted: readonly string[]
  /** Lost at the speaker that gets least, legs after this run included; null: none comes after. */
  readonly withLegs: LossFigures | null
}

/** Everything that follows about one run. */
export interface RunFacts {
  readonly run: Run
  readonly stage: Stage
  /** Which ends are recorded as on. */
  readonly ends: Readonly<Record<EndName, boolean>>
  readonly printed: boolean
  /** Why it is not to be pulled; null: it is. */
  readonly dropped: string | null
  /** The room at its field end; null while it has none. */
  readonly roomId: string | null
  readonly levelId: string | null
  readonly length: LengthMakeUp | null
  readonly lengthMissing: string | null
  readonly speaker: SpeakerFacts | null
  /** Findings about this run, worst first, accepted ones included. */
  readonly findings: readonly Finding[]
}

/** How far a job, a level or a room has come. Dropped runs do not count. */
export interface Progress {
  readonly total: number
  readonly pulled: number
  readonly terminated: number
  readonly tested: number
}
