import { describe, it } from 'vitest'
import * as audioLevel from '../../../shared/calc/analogue/audioLevel.ts'
import * as capacitance from '../../../shared/calc/analogue/capacitance.ts'
import * as serial from '../../../shared/calc/analogue/serial.ts'
import * as supervisedLoop from '../../../shared/calc/analogue/supervisedLoop.ts'
import * as attenuation from '../../../shared/calc/coax/attenuation.ts'
import * as budgetLength from '../../../shared/calc/coax/budgetLength.ts'
import * as level from '../../../shared/calc/coax/level.ts'
import * as splitter from '../../../shared/calc/coax/splitter.ts'
import * as awg from '../../../shared/calc/conductor/awg.ts'
import { iecMaximumOhmPerKm, smallBunchedOhmPerKm } from '../../../shared/calc/conductor/iec60228.table.ts'
import * as kFactor from '../../../shared/calc/conductor/kFactor.ts'
import { necOhmPerKm75 } from '../../../shared/calc/conductor/necTable8.table.ts'
import * as resistance from '../../../shared/calc/conductor/resistance.ts'
import * as conductorTemperature from '../../../shared/calc/conductor/temperature.ts'
import * as linkLoss from '../../../shared/calc/fibre/linkLoss.ts'
import * as poeChannel from '../../../shared/calc/poe/poeChannel.ts'
import { poeClassFor } from '../../../shared/calc/poe/poeClassFor.ts'
import * as class2 from '../../../shared/calc/power/class2.ts'
import * as constantPower from '../../../shared/calc/power/constantPower.ts'
import { longestAtPercentM } from '../../../shared/calc/power/longestAtPercent.ts'
import * as spreadLoad from '../../../shared/calc/power/spreadLoad.ts'
import * as voltageDrop from '../../../shared/calc/power/voltageDrop.ts'
import * as constantVoltage from '../../../shared/calc/speaker/constantVoltage.ts'
import * as damping from '../../../shared/calc/speaker/damping.ts'
import { thinnestThatHolds } from '../../../shared/calc/speaker/gaugeFor.ts'
import { inductiveCornerHz } from '../../../shared/calc/speaker/inductiveCorner.ts'
import { speakerLadder } from '../../../shared/calc/speaker/ladder.ts'
import { leastAreaMm2 } from '../../../shared/calc/speaker/leastArea.ts'
import * as lineLoss from '../../../shared/calc/speaker/lineLoss.ts'
import * as linePower from '../../../shared/calc/speaker/linePower.ts'
import * as lineTree from '../../../shared/calc/speaker/lineTree.ts'
import * as load from '../../../shared/calc/speaker/load.ts'
import * as sharing from '../../../shared/calc/speaker/sharing.ts'
import * as reach from '../../../shared/calc/twistedPair/reach.ts'
import * as pairTemperature from '../../../shared/calc/twistedPair/temperature.ts'
import * as linkReach from '../../../shared/calc/video/linkReach.ts'
import { delayLengthM } from '../../../shared/calc/video/usbLength.ts'
import * as videoCable from '../../../shared/calc/video/videoCable.ts'
import * as videoRate from '../../../shared/calc/video/videoRate.ts'
import { type Calculation, expectPlainAnswers } from './absurdInput.ts'

/** Functions of a module that take numbers alone, as many as each declares and some more for its defaults. */
const numeric = (module: object): [string, Calculation][] =>
  Object.entries(module).flatMap(([name, value]) =>
    typeof value === 'function' ? [[name, (n) => value(...Array.from({ length: value.length + 2 }, n))]] : [],
  )

/** Those that want something else, given below, and those that promise nothing to what is no number. */
const others = new Set([
  'awgInParallel', 'conductorResistanceOhmPerKm', 'attenuationBetween', 'coaxDbPer100M', 'longestPastSplitM',
  'levelAfter', 'dmxRefreshHz', 'fibreLinkLossDb', 'lossSumDb', 'class2MostV', 'isClass2Voltage', 'dropsAlongV',
  'tapsTotalW', 'convertLoss', 'ratioForLoss', 'longestLineM', 'lineNode', 'totalRatio', 'parallelOhm', 'seriesOhm',
  'exactLineVoltage', 'withinLimit', 'parallelSharesW', 'seriesSharesW', 'seriesParallelOhm', 'longestCordsM',
  'temperatureFactor', 'deratedLengthM', 'deratedLinearM', 'meanTemperatureC', 'straightRunM', 'fullClassReachM',
  'bitsPerPixel', 'characterRateMhz', 'tmdsGbps', 'fixedRateGbps', 'poeChannelOhm',
])
const modules = [
  audioLevel, capacitance, serial, supervisedLoop, attenuation, budgetLength, level, splitter, awg, kFactor, resistance,
  conductorTemperature, linkLoss, poeChannel, class2, constantPower, spreadLoad, voltageDrop, constantVoltage, damping,
  lineLoss, linePower, lineTree, load, sharing, reach, pairTemperature, linkReach, videoCable, videoRate,
]
const byNumbers = modules.flatMap(numeric).filter(([name]) => !others.has(name))

const conventions = ['impedance', 'decibel', 'voltage', 'power'] as const
const byConvention: [string, Calculation][] = conventions.flatMap((convention): [string, Calculation][] => [
  [`longestLineM by ${convention}`, (n) => lineLoss.longestLineM(n(), convention, n(), n())],
  [`leastAreaMm2 by ${convention}`, (n) => leastAreaMm2(n(), n(), n(), convention, n())],
  [`ratioForLoss by ${convention}`, (n) => lineLoss.ratioForLoss(n(), convention)],
  [`convertLoss by ${convention}`, (n) => conventions.map((to) => lineLoss.convertLoss(n(), convention, to))],
  [
    `thinnestThatHolds by ${convention}`,
    (n) => thinnestThatHolds([{ id: 'a', conductorOhmPerKm: n() }], n(), n(), n(), convention),
  ],
])
const byChroma: [string, Calculation][] = videoRate.chromas.flatMap((chroma): [string, Calculation][] => [
  [`bitsPerPixel at ${chroma}`, (n) => videoRate.bitsPerPixel(chroma, n())],
  [`characterRateMhz at ${chroma}`, (n) => videoRate.characterRateMhz(n(), chroma, 10)],
  [`tmdsGbps at ${chroma}`, (n) => videoRate.tmdsGbps(n(), chroma, 8)],
  [`fixedRateGbps at ${chroma}`, (n) => videoRate.fixedRateGbps(n(), chroma, 12)],
])

const byForm: [string, Calculation][] = [
  ['awgInParallel', (n) => awg.awgInParallel([n(), n()])],
  ['iecMaximumOhmPerKm', (n) => iecMaximumOhmPerKm(n(), 'class 5/6')],
  ['smallBunchedOhmPerKm', (n) => smallBunchedOhmPerKm(n())],
  ['necOhmPerKm75', (n) => necOhmPerKm75(n(), 'coated', 'solid')],
  ['conductorResistanceOhmPerKm', (n) =>
    resistance.conductorResistanceOhmPerKm(
      { awg: n(), areaMm2: n(), stranding: 'class5', material: 'cca', statedOhmPerKm: null },
      n(),
    )],
  ['attenuationBetween', (n) =>
    attenuation.attenuationBetween({ mhz: n(), attenuation: n() }, { mhz: n(), attenuation: n() }, n())],
  ['coaxDbPer100M', (n) => attenuation.coaxDbPer100M('RG-6', n())],
  ['longestPastSplitM', (n) =>
    budgetLength.longestPastSplitM({
      budgetDb: n(), splitDb: n(), nearM: n(), nearDbPer100M: n(), dbPer100M: n(),
    })],
  ['levelAfter', (n) => splitter.levelAfter(n(), [n(), n()])],
  ['dmxRefreshHz', (n) => serial.dmxRefreshHz({ slots: n(), slotUs: n(), breakUs: n(), markUs: n() })],
  ['fibreLinkLossDb', (n) =>
    linkLoss.fibreLinkLossDb({ lengthKm: n(), dbPerKm: n(), matedPairs: n(), splices: n(), spliceDb: n() })],
  ['lossSumDb', (n) => linkLoss.lossSumDb([n(), n()])],
  ['poeChannelOhm', (n) => poeChannel.poeChannelOhm(n(), n(), 4)],
  ['poeClassFor', (n) => poeClassFor(n())],
  ['isClass2Voltage', (n) => class2.isClass2Voltage(n(), { current: 'AC', wet: true })],
  ['longestAtPercentM', (n) => longestAtPercentM(n(), { sourceV: n(), powerW: n(), kind: 'constant power' }, n())],
  ['dropsAlongV', (n) =>
    spreadLoad.dropsAlongV([{ lengthM: n(), currentA: n() }, { lengthM: n(), currentA: n() }], n())],
  ['tapsTotalW', (n) => constantVoltage.tapsTotalW([{ tapW: n(), count: n() }])],
  ['inductiveCornerHz', (n) => inductiveCornerHz(n(), n(), n())],
  ['speakerLadder', (n) => speakerLadder([{ loopOhm: n(), loadOhm: n() }, { loopOhm: n(), loadOhm: n() }])],
  ['lineNode', (n) =>
    lineTree.lineNode({ loadsOhm: [n()], onward: [{ loopOhm: n(), loadsOhm: [n(), n()], onward: [] }] })],
  ['totalRatio', (n) => lineTree.totalRatio(n(), { behindOhm: n(), worstFactor: n() })],
  ['parallelOhm', (n) => load.parallelOhm([n(), n()])],
  ['seriesOhm', (n) => load.seriesOhm([n(), n()])],
  ['parallelSharesW', (n) => sharing.parallelSharesW(n(), [n(), n()])],
  ['seriesSharesW', (n) => sharing.seriesSharesW(n(), [n(), n()])],
  ['seriesParallelOhm', (n) => sharing.seriesParallelOhm([[n(), n()], [n()]])],
  ['longestCordsM', (n) => reach.longestCordsM(n(), '26')],
  ['temperatureFactor', (n) => pairTemperature.temperatureFactor(n(), false)],
  ['deratedLengthM', (n) => pairTemperature.deratedLengthM(n(), n(), true)],
  ['deratedLinearM', (n) => pairTemperature.deratedLinearM(n(), n(), false)],
  ['meanTemperatureC', (n) =>
    pairTemperature.meanTemperatureC([{ lengthM: n(), temperatureC: n() }, { lengthM: n(), temperatureC: n() }])],
  ['straightRunM', (n) => linkReach.straightRunM(n(), '6')],
  ['fullClassReachM', (n) => linkReach.fullClassReachM(n(), '6A')],
  ['delayLengthM', (n) => delayLengthM(n(), n())],
]

describe('absurd input', () => {
  it.each([...byNumbers, ...byConvention, ...byChroma, ...byForm])(
    'to %s gives null or plain numbers',
    (_name, calculation) => expectPlainAnswers(calculation),
  )
})
