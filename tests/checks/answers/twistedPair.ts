import { bendFactors, radiusForFactorMm } from '../../../shared/calc/support/bendRadius.ts'
import { newtonsOfPoundsForce } from '../../../shared/calc/support/poundsForce.ts'
import { pullTensions } from '../../../shared/calc/support/pullTension.table.ts'
import {
  categoryBandwidthMhz,
  ethernetKinds,
  ethernetReachM,
  pairCategories,
} from '../../../shared/calc/twistedPair/ethernetReach.table.ts'
import { pairPins, pinColours, pinSchemes } from '../../../shared/calc/twistedPair/pins.table.ts'
import { cordsForFactorM, workAreaCordM } from '../../../shared/calc/twistedPair/reach.ts'
import { deratedLengthM, deratedLinearM, temperatureFactor } from '../../../shared/calc/twistedPair/temperature.ts'
import { twistedPairLimits } from '../../../shared/calc/twistedPair/twistedPair.table.ts'
import { mmToFeet } from '../../../shared/units.ts'
import { type Answers, type FactAnswers, type Inputs, metres, num, oneOf, text } from './readInputs.ts'

const screened = (i: Inputs) => i['screened'] === true
const category = (i: Inputs) => oneOf(text(i, 'category'), pairCategories)
const scheme = (i: Inputs) => oneOf(text(i, 'scheme'), pinSchemes)

/** Limits by what rows call them. */
export const twistedPairLimitNames: readonly (readonly [RegExp, number])[] = [
  [/cord.*total|total.*cord/i, twistedPairLimits.cordsM],
  [/(mutoa|work_?area).*iso|iso.*(mutoa|work_?area)/i, twistedPairLimits.workAreaCordIsoM],
  [/mutoa|work_?area/i, twistedPairLimits.workAreaCordM],
  [/pull.*lbf/i, pullTensions['four-pair'].poundsForce],
  [/pull/i, pullTensions['four-pair'].mostN],
  [/untwist.*in$/i, twistedPairLimits.untwistIn],
  [/untwist/i, twistedPairLimits.untwistMm],
  [/bend.*(f_?utp|stp|ftp|screen|shield)/i, twistedPairLimits.screenedBendFactor],
  [/bend/i, bendFactors['four-pair']],
  [/conductor.*ohm/i, twistedPairLimits.conductorOhmPer100M],
  [/cat.*8|channel.*8/i, twistedPairLimits.category8ChannelM],
  [/(permanent|link).*ft$/i, twistedPairLimits.permanentLinkFt],
  [/^channel.*ft$/i, twistedPairLimits.channelFt],
  [/permanent|link/i, twistedPairLimits.permanentLinkM],
  [/^channel(_max|_total)?_m$/i, twistedPairLimits.channelM],
]

export const twistedPairAnswers: Answers = {
  patch_total_m: (i) => cordsForFactorM(num(i, 'h_m'), num(i, 'd')),
  patch_work_m: (i) => workAreaCordM(num(i, 'h_m'), num(i, 'd'), num(i, 't_m')),
  temp_il_factor: (i) => temperatureFactor(num(i, 'temp_C'), screened(i)),
  derated_len_m: (i) => deratedLengthM(num(i, 'base_m'), num(i, 'temp_C'), screened(i)),
  derated_len_linear_m: (i) => deratedLinearM(num(i, 'base_m'), num(i, 'temp_C'), screened(i)),
  m_to_ft: (i) => mmToFeet(metres(num(i, 'm'))),
  lbf_to_n: (i) => newtonsOfPoundsForce(num(i, 'lbf')),
  bend_radius_mm: (i) => radiusForFactorMm(num(i, 'mult'), num(i, 'od_mm')),
}

export const twistedPairFacts: FactAnswers = [
  [
    /category bandwidth/,
    (i) => {
      const name = category(i)
      return name && categoryBandwidthMhz[name]
    },
  ],
  [
    /maximum channel/,
    (i) => {
      const [kind, name] = [ethernetKinds.find((known) => text(i, 'phy').startsWith(known)), category(i)]
      // A remark in brackets says how bad the neighbours are; without one the worst is meant.
      const crosstalk = /\((?!hostile|worst)/i.test(text(i, 'phy')) ? 'benign' : 'hostile'
      return kind && name && ethernetReachM(kind, name, crosstalk)
    },
  ],
  [
    /^pins 1/,
    (i) => {
      const name = scheme(i)
      return name && pinColours[name]
    },
  ],
  [
    /^pair -> pins/,
    (i) => {
      const name = scheme(i)
      return name && pairPins[name]
    },
  ],
]
