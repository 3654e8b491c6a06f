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

/** A loss with its unit: "0.74 dB", "13.1 % of the load". Decimals as the convention has them unless more are asked for. */
export const lossText = (value: number, convention: LossConvention, decimals = lossWords[convention].decimals): string => {
  const figure = `${formatNumber(value, decimals)} ${lossWords[convention].unit}`
  return convention === 'impedance' ? `${figure} of the load` : figure
}

/** As many decimals as it takes to tell a loss from the limit it is over; four at most. */
export function decimalsApart(value: number, limit: number, convention: LossConvention): number {
  let decimals = lossWords[convention].decimals
  while (decimals < 4 && value.toFixed(decimals) === limit.toFixed(decimals)) decimals++
  return decimals
}
