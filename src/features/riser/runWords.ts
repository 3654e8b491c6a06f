import type { Derived } from '../../../shared/derive/deriveJob.ts'
import { find, jobOf, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { formatLength } from '../../../shared/units.ts'

/** A run in one breath, for whoever listens instead of looking: "PAT1-S1, 16/2 white, 88 ft, planned, caution". */
export function runWords(doc: JobDocument, derived: Derived, runId: string): string {
  const facts = derived.runs.get(runId)
  if (!facts) return 'a run that is gone'
  const type = find(doc, 'cableType', facts.run.cableTypeId)
  const length = facts.length ? formatLength(facts.length.totalMm, jobOf(doc).lengthUnit, { as: 'whole' }) : 'no length yet'
  const worst = facts.findings.find((finding) => !finding.accepted)?.severity
  const dropped = facts.dropped === null ? [] : ['dropped']
  return [facts.run.label, type ? `${type.code} ${type.jacketColour}` : 'unknown cable', length, facts.stage, ...dropped, ...(worst ? [worst] : [])].join(', ')
}
