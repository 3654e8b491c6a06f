import type { Intent } from '../commands/index.ts'
import type { Reference } from '../model/references.ts'

/** A stop cannot work or is unsafe; a caution is outside the limit the company judges by; a note is worth knowing. */
export const severities = ['stop', 'caution', 'note'] as const
export type Severity = (typeof severities)[number]

/** Where a rule comes from: published code, a published standard, or the trade's practice. */
export const tiers = ['code', 'standard', 'practice'] as const
export type Tier = (typeof tiers)[number]

/** A number with its unit, and as it is written on a screen. */
export interface Figure {
  readonly value: number
  readonly unit: string
  readonly text: string
}

export interface Limit extends Figure {
  /** Who set it: the product's default, the company, or this job. */
  readonly setBy: 'default' | 'company' | 'job' | 'source'
}

/** What would put it right, ready to be sent. */
export interface Remedy {
  /** What the button says: "Change to 14/2". */
  readonly label: string
  readonly intent: Intent
}

/** What one check says of one thing. Advice, not an inspection. */
export interface Finding {
  /** The check's id: a file in shared/checks. */
  readonly check: string
  readonly severity: Severity
  readonly tier: Tier
  readonly about: Reference
  /** What the thing is called: the run's label, a port, a plate. */
  readonly aboutName: string
  /** Two or three words: "Speaker loss". */
  readonly title: string
  /** What was measured, at what, against what limit. */
  readonly sentence: string
  /** What would help, with its number; empty where nothing is offered. */
  readonly advice: string
  readonly figure: Figure | null
  readonly limit: Limit | null
  /** The formula with this thing's numbers, for "why". */
  readonly basis: string
  /** Publication, edition and standing. */
  readonly source: string
  readonly remedy: Remedy | null
  /** The figures it rests on, as one string: an acceptance holds while this stays the same. */
  readonly figures: string
  /** The acceptance in force, if somebody took it on. */
  readonly accepted: { readonly id: string; readonly reason: string; readonly byId: string; readonly at: string } | null
}
