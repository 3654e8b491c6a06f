import type { JobReader } from '../derive/jobReader.ts'
import type { Acceptance } from '../model/fieldRecord.ts'
import { defaultLimits, type Limits } from '../model/limits.ts'
import type { RecordOf } from '../model/record.ts'
import { isStruck } from '../model/struck.ts'
import { formatLength, mmPerFoot, mmPerMetre, type LengthUnit } from '../units.ts'
import type { Finding, Limit, Severity, Tier } from './finding.ts'

/** Kinds that checks look at. */
export const checkedKinds = ['run', 'cord', 'device', 'room'] as const
export type CheckedKind = (typeof checkedKinds)[number]

/** A line that a check judges by, as it is written. */
export interface StatedLimit {
  readonly severity: Severity
  readonly text: string
}

/** One rule: what it looks at, where it comes from, and what it says. */
export interface Check<K extends CheckedKind = CheckedKind> {
  readonly id: string
  readonly title: string
  /** What is checked, for a person who wonders. */
  readonly what: string
  readonly tier: Tier
  /** Publication and edition, with its standing. */
  readonly source: string
  readonly about: K
  readonly limits: (limits: Limits, unit: LengthUnit) => readonly StatedLimit[]
  readonly look: (reader: JobReader, record: RecordOf<K>) => readonly Draft[]
}

/** A finding before it is known whose it is and whether somebody took it on. */
export type Draft = Pick<Finding, 'severity' | 'aboutName' | 'sentence' | 'figures' | 'basis'> & Partial<Pick<Finding, 'advice' | 'figure' | 'limit' | 'remedy'>>

export const defineCheck = <K extends CheckedKind>(check: Check<K>): Check<K> => check

/** As many characters of figures as an acceptance keeps. */
const mostFigures = 400

/** What a check finds about a record, with the acceptance that holds: one that was given for these very figures. */
export function findingsOf<K extends CheckedKind>(check: Check<K>, reader: JobReader, record: RecordOf<K>): Finding[] {
  return check.look(reader, record).map((draft) => ({
    check: check.id,
    tier: check.tier,
    title: check.title,
    source: check.source,
    about: { kind: record.kind, id: record.id },
    advice: '',
    figure: null,
    limit: null,
    remedy: null,
    ...draft,
    figures: draft.figures.slice(0, mostFigures),
    accepted: acceptanceOf(reader, check.id, record, draft.figures.slice(0, mostFigures)),
  }))
}

function acceptanceOf(reader: JobReader, check: string, record: { kind: string; id: string }, figures: string): Finding['accepted'] {
  const holds = reader.under<Acceptance>(`accepted ${check} ${record.kind}:${record.id}`).filter((each) => each.figures === figures && !isStruck(reader.doc, 'acceptance', each.id))
  const last = holds.at(-1)
  return last ? { id: last.id, reason: last.reason, byId: last.byId, at: last.at } : null
}

/** Who set a limit: the product, as long as the job has not changed it. */
export const setBy = (limits: Limits, key: keyof Limits): Limit['setBy'] => (limits[key] === defaultLimits[key] ? 'default' : 'job')

/** A length in the job's unit, whole, for sentences. */
export const lengthText = (reader: JobReader, mm: number): string => formatLength(mm, reader.job().lengthUnit, { as: 'whole' })

/** How far something goes, down to the whole unit: a reach is never rounded up. */
export function reachText(reader: JobReader, mm: number): string {
  const unit = reader.job().lengthUnit === 'm' ? mmPerMetre : mmPerFoot
  return lengthText(reader, Math.floor(mm / unit + 1e-9) * unit)
}

/** Two lengths in whole units, or exactly where whole units would read alike. */
export function lengthsApart(reader: JobReader, a: number, b: number): readonly [string, string] {
  const whole = [lengthText(reader, a), lengthText(reader, b)] as const
  if (a === b || whole[0] !== whole[1]) return whole
  const exact = (mm: number) => formatLength(mm, reader.job().lengthUnit, { as: 'exact' })
  return [exact(a), exact(b)]
}
