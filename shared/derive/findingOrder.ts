import { severities, type Finding } from '../checks/finding.ts'

const collator = new Intl.Collator('en', { numeric: true })

/** Worst first, then by name as a person reads it (PAT2 before PAT10), then by check; the rest only settles ties. */
export function compareFindings(a: Finding, b: Finding): number {
  return (
    severities.indexOf(a.severity) - severities.indexOf(b.severity) ||
    collator.compare(a.aboutName, b.aboutName) ||
    compareText(a.check, b.check) ||
    compareText(a.about.kind, b.about.kind) ||
    compareText(a.about.id, b.about.id)
  )
}

const compareText = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0)

export const sortedFindings = (findings: readonly Finding[]): readonly Finding[] => (findings.length < 2 ? findings : [...findings].sort(compareFindings))

/** Two sorted lists as one. */
export function mergeFindings(a: readonly Finding[], b: readonly Finding[]): readonly Finding[] {
  if (!b.length) return a
  const merged: Finding[] = []
  let from = 0
  for (const finding of b) {
    const to = placeOf(finding, a, from)
    while (from < to) merged.push(a[from++]!)
    merged.push(finding)
  }
  while (from < a.length) merged.push(a[from++]!)
  return merged
}

/** Where a finding goes in a sorted list, from a position on: by halving. */
function placeOf(finding: Finding, list: readonly Finding[], from: number): number {
  let [low, high] = [from, list.length]
  while (low < high) {
    const middle = (low + high) >> 1
    if (compareFindings(list[middle]!, finding) <= 0) low = middle + 1
    else high = middle
  }
  return low
}
