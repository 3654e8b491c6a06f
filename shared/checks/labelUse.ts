import { lengthOf } from '../derive/lengthOf.ts'
import type { Run } from '../model/run.ts'
import { defineCheck } from './define.ts'

export const labelUse = defineCheck({
  id: 'labelUse',
  title: 'Labels',
  what: 'That a label names one cable, capitals or not',
  tier: 'standard',
  source: 'TIA-606: an identifier is unique (read in public summaries)',
  about: 'run',
  limits: () => [{ severity: 'stop', text: 'two alike' }],
  look: (reader, run) => {
    const same = reader.under<Run>(`label ${run.label.toUpperCase()}`)
    if (same.length < 2) return []
    // The one that is printed keeps its label; of several such, the oldest.
    const isPrinted = (each: Run) => lengthOf(reader, each).said.printed
    const [first] = [...same].sort((a, b) => Number(isPrinted(b)) - Number(isPrinted(a)) || a.serial - b.serial)
    if (first?.id === run.id) return []
    return [
      {
        severity: 'stop',
        aboutName: run.label,
        sentence: `${same.length} runs are labelled ${run.label}.`,
        advice: isPrinted(run) ? 'Both are printed: strike out the print of one, and label it anew.' : 'Give this one a label of its own before it is printed.',
        basis: `${same.length} runs carry this label`,
        figures: [run.label, same.length].join('|'),
        remedy: isPrinted(run) ? null : { label: 'Label it by the pattern', intent: { verb: 'run.relabel', args: { ids: [run.id] } } },
      },
    ]
  },
})
