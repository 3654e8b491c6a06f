import {
  ambientFactor,
  bundleAmpacityA,
  halfLoadedAmpacityA,
  isBundleExempt,
  largestBundle,
} from '../../../shared/calc/bundle/bundleAmpacity.ts'
import { bundleGauges, cableRatingsC } from '../../../shared/calc/bundle/bundleAmpacity.table.ts'
import { bendRadiusMm, type BentCable, fibreCordRadiusMm } from '../../../shared/calc/support/bendRadius.ts'
import { newtonsOfPoundsForce } from '../../../shared/calc/support/poundsForce.ts'
import { pullTensions } from '../../../shared/calc/support/pullTension.table.ts'
import {
  hookCapacity,
  isSpanShortEnough,
  longestSpanMm,
  supportsBetween,
} from '../../../shared/calc/support/supports.ts'
import { type Answers, byWords, feet, type Inputs, num, text } from './readInputs.ts'

const bent: readonly (readonly [RegExp, BentCable])[] = [
  [/bonding/i, 'bonding backbone'],
  [/multi-?pair/i, 'multipair backbone'],
  [/fib.*load/i, 'fibre under load'],
  [/fib/i, 'fibre at rest'],
  [/coax/i, 'coaxial'],
  [/4-?pair|four-?pair|utp|cat/i, 'four-pair'],
]
const constants: readonly (readonly [RegExp, number])[] = [
  [/pull.*fib.*lbf|fib.*pull.*lbf/i, pullTensions['horizontal fibre'].poundsForce],
  [/pull.*fib|fib.*pull/i, pullTensions['horizontal fibre'].mostN],
  [/pull.*lbf/i, pullTensions['four-pair'].poundsForce],
  [/pull/i, pullTensions['four-pair'].mostN],
  [/fib.*cord/i, fibreCordRadiusMm],
  [/(span|support).*mm/i, longestSpanMm],
  [/(span|support).*ft/i, longestSpanMm / 304.8],
  [/(span|support)/i, longestSpanMm / 1000],
  [/hook.*small/i, hookCapacity.small],
  [/hook.*large/i, hookCapacity.large],
]
const gauge = (i: Inputs) => bundleGauges.find((awg) => awg === num(i, 'awg'))
const rating = (i: Inputs) => cableRatingsC.find((celsius) => celsius === num(i, 'temp_rating'))

export const supportAnswers: Answers = {
  bend: (i) => {
    if (/fib.*cord/i.test(text(i, 'type'))) return fibreCordRadiusMm
    const cable = byWords(text(i, 'type'), bent)
    return cable && bendRadiusMm(cable, num(i, 'od_mm'))
  },
  const: (i) => byWords(text(i, 'item'), constants),
  lbf: (i) => newtonsOfPoundsForce(num(i, 'lbf')),
  supports: (i) => supportsBetween(feet(num(i, 'L')), feet(num(i, 's'))),
  span_ok: (i) => isSpanShortEnough(feet(num(i, 'span_ft'))),
  poe: (i) => {
    const [awg, ratingC] = [gauge(i), rating(i)]
    return awg && ratingC && bundleAmpacityA(awg, num(i, 'bundle'), ratingC)
  },
  poe_corr: (i) => ambientFactor(num(i, 'Tr'), num(i, 'Ta')),
  poe_maxbundle: (i) => {
    const [awg, ratingC] = [gauge(i), rating(i)]
    return awg && ratingC && largestBundle({ awg, ratingC, ambientC: num(i, 'Ta'), currentA: num(i, 'I') })
  },
  poe_exempt: (i) => isBundleExempt(num(i, 'I'), num(i, 'awg')),
  poe_half: (i) => halfLoadedAmpacityA(num(i, 'amp')),
}
