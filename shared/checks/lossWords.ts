import type { LossFigures } from '../derive/facts.ts'
import type { LossConvention } from '../model/limits.ts'
import { formatNumber } from '../units.ts'

/** What a convention calls its figure, in a sentence and as a unit. */
export const lossWords: Record<LossConvention, { readonly unit: string; readonly name: string; readonly decimals: number; readonly formula: string }> = {
  decibel: { unit: 'dB', name: 'level lost at the speaker', decimals: 2, formula: '20 log (1 + Rc/Z)' },
  impedance: { unit: '%', name: 'loop resistance as a share of the load', decimals: 1, formula: 'Rc/Z' },
  voltage: { unit: '%', name: 'voltage lost in the cable', decimals: 1, formula: 'Rc/(Rc + Z)' },
  power: { unit: '%', name: 'power missing at the speaker', decimals: 1, formula: '1 - (Z/(Z + Rc))²' },
}

/** A loss by one convention, in its unit. */
export const lossIn = (facts: LossFigures, convention: LossConvention): number =>
  ({ decibel: facts.lossDb, impedance: facts.impedancePercent, voltage: facts.voltagePercent, power: facts.powerPercent })[convention]

/** A loss with its unit: "0.74 dB", "13.1 % of the load". */
export const lossText = (value: number, convention: LossConvention): string => {
  const { unit, decimals } = lossWords[convention]
  const figure = `${formatNumber(value, decimals)} ${unit}`
  return convention === 'impedance' ? `${figure} of the load` : figure
}
