import { describe, it } from 'vitest'
import { administrationClass } from '../../../shared/calc/administration/administrationClass.ts'
import { isLabelNearEnd } from '../../../shared/calc/administration/labelPlace.ts'
import { cablesForGrade } from '../../../shared/calc/administration/residentialGrade.ts'
import { outletsForWall } from '../../../shared/calc/administration/wallOutlets.ts'
import { fitBarcode } from '../../../shared/calc/barcode/barcodeFit.ts'
import { code128Check } from '../../../shared/calc/barcode/code128Check.ts'
import { code128Pattern } from '../../../shared/calc/barcode/code128Pattern.ts'
import { barHeightMm, code128Modules, code128WidthMm } from '../../../shared/calc/barcode/code128Size.ts'
import { qrCapacity, qrVersionFor } from '../../../shared/calc/barcode/qrCapacity.ts'
import { qrModuleFitMm, qrSide, qrSideMm } from '../../../shared/calc/barcode/qrSize.ts'
import {
  ambientFactor,
  bundleAmpacityA,
  halfLoadedAmpacityA,
  isBundleExempt,
  largestBundle,
} from '../../../shared/calc/bundle/bundleAmpacity.ts'
import { isJoistHoleClear, largestJoistHoleIn } from '../../../shared/calc/framing/joistHole.ts'
import { isInMiddleThird, largestJoistNotch } from '../../../shared/calc/framing/joistNotch.ts'
import { needsNailPlate, needsPlateAlong } from '../../../shared/calc/framing/nailPlate.ts'
import { deepestStudNotchIn, largestStudHoleIn } from '../../../shared/calc/framing/studHole.ts'
import { spaceFit } from '../../../shared/calc/jacket/spaceFit.ts'
import { entranceLengthMm, mayEnterUnlisted } from '../../../shared/calc/jacket/unlistedEntrance.ts'
import { labelOrigin, labelPlace, sheetClosure } from '../../../shared/calc/labelStock/sheetGeometry.ts'
import { capitalHeightMm, characterHeightMm, pointsForCapital } from '../../../shared/calc/labelStock/textHeight.ts'
import {
  circumferenceMm,
  readablePrintMm,
  wrapLargestDiameterMm,
  wrapLeastLengthMm,
  wrapUsualLengthMm,
} from '../../../shared/calc/labelStock/wrapLabel.ts'
import { crewDays, factoredHours, hoursByLength, labourHours } from '../../../shared/calc/labour/labourHours.ts'
import { isBs2051Position } from '../../../shared/calc/layout/bs2051.ts'
import {
  isBs775Azimuth,
  isBs775Height,
  pictureAngleDeg,
  surroundAzimuthsDeg,
} from '../../../shared/calc/layout/bs775.ts'
import { amplifierChannels } from '../../../shared/calc/layout/channelCount.ts'
import { azimuthOfDeg, polarPosition } from '../../../shared/calc/layout/polarPosition.ts'
import { speakerElevationDeg, speakerHeightM } from '../../../shared/calc/layout/speakerHeight.ts'
import {
  isTopWithin,
  pictureWidth,
  topAngleDeg,
  viewingAngleDeg,
  viewingDistance,
} from '../../../shared/calc/layout/viewingDistance.ts'
import { averagedTotalMm } from '../../../shared/calc/length/averageLength.ts'
import { boxesByRuns, boxesByTotal } from '../../../shared/calc/length/boxCount.ts'
import { framingDetour } from '../../../shared/calc/length/framingDetour.ts'
import { markDifference, pulledLengthMm } from '../../../shared/calc/length/jacketMarks.ts'
import { isWithinLink } from '../../../shared/calc/length/linkLimit.ts'
import { markDoubts } from '../../../shared/calc/length/markPlausibility.ts'
import { orderLengthMm, outsidePlantLengthMm, roundUpToStepMm } from '../../../shared/calc/length/orderQuantity.ts'
import { overheadLengthMm } from '../../../shared/calc/length/overheadLength.ts'
import { storeyLengthMm } from '../../../shared/calc/length/storeyLength.ts'
import { underfloorLengthMm } from '../../../shared/calc/length/underfloorLength.ts'
import { framedWallHeightIn } from '../../../shared/calc/length/wallHeight.ts'
import { bendsTotalDeg, isPullWithinCode, isPullWithinTelecom } from '../../../shared/calc/pathway/bends.ts'
import { cablesAreaIn2, fillPercent, summedAreaIn2 } from '../../../shared/calc/pathway/cableArea.ts'
import { cablesInRaceway } from '../../../shared/calc/pathway/cablesInRaceway.ts'
import { allowedFillIn2, fillLimitShare } from '../../../shared/calc/pathway/fillLimit.ts'
import { jamRatio, mayJam } from '../../../shared/calc/pathway/jam.ts'
import { boreForPlugIn, doesPlugPass, racewayForPlug } from '../../../shared/calc/pathway/plugPass.ts'
import { anglePullBoxIn, straightPullBoxIn } from '../../../shared/calc/pathway/pullBox.ts'
import { racewayBendRadiusIn } from '../../../shared/calc/pathway/racewayBend.ts'
import { boreAreaIn2, smallestBore } from '../../../shared/calc/pathway/racewayBore.ts'
import { countForLongPull, reducedCount, reducedSize } from '../../../shared/calc/pathway/reducedCount.ts'
import { sleeveFill } from '../../../shared/calc/pathway/sleeve.ts'
import { smallestRaceway } from '../../../shared/calc/pathway/smallestRaceway.ts'
import { circuitFactor, equivalentCircuits, separationEn50174Mm } from '../../../shared/calc/separation/en50174.ts'
import { isClearOfPower } from '../../../shared/calc/separation/necSeparation.ts'
import { separationTia569In } from '../../../shared/calc/separation/tia569.ts'
import { cutPlan } from '../../../shared/calc/spool/cutPlan.ts'
import {
  bestFitDecreasing,
  firstFitDecreasing,
  firstFitGuarantee,
} from '../../../shared/calc/spool/firstFitDecreasing.ts'
import { leastSpools } from '../../../shared/calc/spool/leastSpools.ts'
import { isTooLong } from '../../../shared/calc/spool/isTooLong.ts'
import { fewestSpools, spoolsByMartelloToth, spoolsByTotal } from '../../../shared/calc/spool/spoolBounds.ts'
import { bendRadiusMm } from '../../../shared/calc/support/bendRadius.ts'
import { newtonsOfPoundsForce } from '../../../shared/calc/support/poundsForce.ts'
import { isSpanShortEnough, supportsBetween } from '../../../shared/calc/support/supports.ts'
import { symbolExtentMm } from '../../../shared/calc/symbol/symbolExtent.ts'
import { type Calculation, expectPlainAnswers } from './absurdInput.ts'

/** Every calculation that takes a number, fed by `n`. */
const calculations: Record<string, Calculation> = {
  administrationClass: (n) => administrationClass({ telecomSpaces: n(), buildings: n(), sites: n() }),
  isLabelNearEnd: (n) => isLabelNearEnd(n()),
  cablesForGrade: (n) => cablesForGrade(2, n()),
  outletsForWall: (n) => outletsForWall(n()),
  fitBarcode: (n) => fitBarcode({ characters: n(), roomMm: n(), dotsPerInch: n() }),
  code128Check: (n) => code128Check(n(), [n(), n()]),
  code128Pattern: (n) => code128Pattern(n()),
  barHeightMm: (n) => barHeightMm(n()),
  code128Modules: (n) => code128Modules(n()),
  code128WidthMm: (n) => code128WidthMm(n(), n()),
  qrCapacity: (n) => qrCapacity(n(), 'M', 'byte'),
  qrVersionFor: (n) => qrVersionFor(n(), 'M'),
  qrModuleFitMm: (n) => qrModuleFitMm(n(), n(), n()),
  qrSide: (n) => qrSide(n()),
  qrSideMm: (n) => qrSideMm(n(), n()),
  ambientFactor: (n) => ambientFactor(n(), n()),
  bundleAmpacityA: (n) => bundleAmpacityA(24, n(), 60),
  halfLoadedAmpacityA: (n) => halfLoadedAmpacityA(n()),
  isBundleExempt: (n) => isBundleExempt(n(), n()),
  largestBundle: (n) => largestBundle({ awg: 24, ratingC: 60, ambientC: n(), currentA: n() }),
  isJoistHoleClear: (n) => isJoistHoleClear(n()),
  largestJoistHoleIn: (n) => largestJoistHoleIn(n()),
  isInMiddleThird: (n) => isInMiddleThird(n(), n()),
  largestJoistNotch: (n) => largestJoistNotch(n()),
  needsNailPlate: (n) => needsNailPlate(n(), n(), n()),
  needsPlateAlong: (n) => needsPlateAlong(n()),
  deepestStudNotchIn: (n) => deepestStudNotchIn({ depthIn: n(), isBearing: true }),
  largestStudHoleIn: (n) => largestStudHoleIn({ depthIn: n(), isBearing: false }),
  spaceFit: (n) =>
    spaceFit({ marking: 'CMX', space: 'general', occupancy: 'other', outerDiameterMm: n(), exposedMm: n() }),
  entranceLengthMm: (n) => entranceLengthMm(n(), n()),
  mayEnterUnlisted: (n) => mayEnterUnlisted({ lengthMm: n(), isTerminated: true, space: 'general' }),
  labelOrigin: (n) => labelOrigin(absurdSheet(n), n(), n()),
  labelPlace: (n) => labelPlace(absurdSheet(n), n(), { startAt: n(), offsetXMm: n(), offsetYMm: n() }),
  sheetClosure: (n) => sheetClosure(absurdSheet(n)),
  capitalHeightMm: (n) => capitalHeightMm(n()),
  characterHeightMm: (n) => characterHeightMm(n(), n()),
  pointsForCapital: (n) => pointsForCapital(n()),
  circumferenceMm: (n) => circumferenceMm(n()),
  readablePrintMm: (n) => readablePrintMm(n()),
  wrapLargestDiameterMm: (n) => wrapLargestDiameterMm(n(), n()),
  wrapLeastLengthMm: (n) => wrapLeastLengthMm(n(), n(), n()),
  wrapUsualLengthMm: (n) => wrapUsualLengthMm(n()),
  crewDays: (n) => crewDays(n(), n()),
  factoredHours: (n) => factoredHours(n(), n(), n()),
  hoursByLength: (n) => hoursByLength(n(), n()),
  labourHours: (n) =>
    labourHours([
      { quantity: n(), hoursEach: n() },
      { quantity: n(), hoursEach: n() },
    ]),
  isBs2051Position: (n) => isBs2051Position('9+10+3', 'M+180', { azimuthDeg: n(), elevationDeg: n() }, n()),
  isBs775Azimuth: (n) => isBs775Azimuth('L', n(), n()),
  isBs775Height: (n) => isBs775Height('LS', n(), n(), n()),
  pictureAngleDeg: (n) => pictureAngleDeg(n(), n()),
  surroundAzimuthsDeg: (n) => surroundAzimuthsDeg(Math.min(n(), 1000)),
  amplifierChannels: (n) => amplifierChannels(['5.1'], n()),
  azimuthOfDeg: (n) => azimuthOfDeg(n(), n()),
  polarPosition: (n) => polarPosition(n(), n()),
  speakerElevationDeg: (n) => speakerElevationDeg(n(), n()),
  speakerHeightM: (n) => speakerHeightM(n(), n()),
  isTopWithin: (n) => isTopWithin(n(), n(), n(), n()),
  pictureWidth: (n) => pictureWidth(n(), n()),
  topAngleDeg: (n) => topAngleDeg(n(), n(), n()),
  viewingAngleDeg: (n) => viewingAngleDeg(n(), n()),
  viewingDistance: (n) => viewingDistance(n(), n()),
  averagedTotalMm: (n) => averagedTotalMm({ shortestMm: n(), longestMm: n(), slackMm: n(), dropMm: n(), runs: n() }),
  boxesByRuns: (n) => boxesByRuns(n(), n(), n()),
  boxesByTotal: (n) => boxesByTotal(n(), n(), n()),
  framingDetour: (n) => framingDetour(n(), n()),
  markDifference: (n) => markDifference(n(), n(), n()),
  pulledLengthMm: (n) => pulledLengthMm({ start: n(), end: n(), unit: 'ft', counter: null }),
  isWithinLink: (n) => isWithinLink(n(), n(), n()),
  markDoubts: (n) =>
    markDoubts({ start: n(), end: n(), unit: 'm', counter: n() }, { leastMm: n(), estimateMm: n(), putUpMm: n() }),
  orderLengthMm: (n) => orderLengthMm(n(), n(), n()),
  outsidePlantLengthMm: (n) => outsidePlantLengthMm(n(), n(), n()),
  roundUpToStepMm: (n) => roundUpToStepMm(n(), n()),
  overheadLengthMm: (n) =>
    overheadLengthMm({
      alongXMm: n(),
      alongYMm: n(),
      ceilingHeightMm: n(),
      boxHeightMm: n(),
      headHeightMm: n(),
      slackBoxMm: n(),
      slackHeadMm: n(),
      overheadMm: n(),
    }),
  storeyLengthMm: (n) =>
    storeyLengthMm({
      alongXMm: n(),
      alongYMm: n(),
      lowerCeilingHeightMm: n(),
      headHeightMm: n(),
      floorDepthMm: n(),
      upperBoxHeightMm: n(),
      slackBoxMm: n(),
      slackHeadMm: n(),
      passedWallHeightsMm: [n()],
    }),
  underfloorLengthMm: (n) =>
    underfloorLengthMm({
      alongXMm: n(),
      alongYMm: n(),
      boxHeightMm: n(),
      headHeightMm: n(),
      floorThicknessMm: n(),
      slackBoxMm: n(),
      slackHeadMm: n(),
    }),
  framedWallHeightIn: (n) => framedWallHeightIn(n(), n()),
  bendsTotalDeg: (n) => bendsTotalDeg([n(), n()]),
  isPullWithinCode: (n) => isPullWithinCode([n(), n()]),
  isPullWithinTelecom: (n) => isPullWithinTelecom([n()], n()),
  cablesAreaIn2: (n) => cablesAreaIn2([{ cables: n(), outerDiameterIn: n() }]),
  summedAreaIn2: (n) => summedAreaIn2([{ cables: n(), areaIn2: n() }]),
  fillPercent: (n) => fillPercent(n(), n()),
  cablesInRaceway: (n) => cablesInRaceway(n(), n()),
  allowedFillIn2: (n) => allowedFillIn2(n(), n()),
  fillLimitShare: (n) => fillLimitShare(n()),
  jamRatio: (n) => jamRatio(n(), n()),
  mayJam: (n) => mayJam(n(), n(), n()),
  boreForPlugIn: (n) => boreForPlugIn({ widthIn: n(), heightIn: n() }),
  doesPlugPass: (n) => doesPlugPass({ widthIn: n(), heightIn: n() }, n()),
  racewayForPlug: (n) => racewayForPlug('EMT', { widthIn: n(), heightIn: n() }),
  anglePullBoxIn: (n) => anglePullBoxIn(n(), [n()]),
  straightPullBoxIn: (n) => straightPullBoxIn(n()),
  racewayBendRadiusIn: (n) => racewayBendRadiusIn(n()),
  boreAreaIn2: (n) => boreAreaIn2(n()),
  smallestBore: (n) => smallestBore('FMC', n()),
  countForLongPull: (n) => countForLongPull(n(), n(), [n()]),
  reducedCount: (n) => reducedCount('1', n()),
  reducedSize: (n) => reducedSize(n(), n()),
  sleeveFill: (n) =>
    sleeveFill({ insideDiameterIn: n(), listedFillPercent: n() }, [{ cables: n(), outerDiameterIn: n() }]),
  smallestRaceway: (n) => smallestRaceway('EMT', { cablesIn2: n(), cables: n() }),
  circuitFactor: (n) => circuitFactor(n()),
  equivalentCircuits: (n) => equivalentCircuits(3, n()),
  separationEn50174Mm: (n) => separationEn50174Mm('b', 'none', n()),
  isClearOfPower: (n) => isClearOfPower({ power: 'single conductors', gapMm: n(), hasNonconductor: false }),
  separationTia569In: (n) => separationTia569In('open-open', n()),
  cutPlan: (n) =>
    cutPlan({
      runs: [
        { id: 'a', lengthMm: n() },
        { id: 'b', lengthMm: n() },
      ],
      putUps: [{ id: 'p', lengthMm: n() }],
      onHand: [{ id: 's', leftMm: n() }],
      stubMm: n(),
      reserve: n(),
      effort: 1000,
    }),
  bestFitDecreasing: (n) => bestFitDecreasing([n(), n()], n()),
  firstFitDecreasing: (n) => firstFitDecreasing([n(), n()], n()),
  firstFitGuarantee: (n) => firstFitGuarantee(n()),
  leastSpools: (n) => leastSpools([n(), n(), n()], n(), 1000),
  isTooLong: (n) => isTooLong(n(), n()),
  fewestSpools: (n) => fewestSpools([n(), n()], n()),
  spoolsByMartelloToth: (n) => spoolsByMartelloToth([n(), n()], n()),
  spoolsByTotal: (n) => spoolsByTotal([n(), n()], n()),
  bendRadiusMm: (n) => bendRadiusMm('coaxial', n()),
  newtonsOfPoundsForce: (n) => newtonsOfPoundsForce(n()),
  isSpanShortEnough: (n) => isSpanShortEnough(n()),
  supportsBetween: (n) => supportsBetween(n(), n()),
  symbolExtentMm: (n) => symbolExtentMm(n(), n()),
}

const absurdSheet = (n: () => number) => ({
  widthMm: n(),
  heightMm: n(),
  columns: n(),
  rows: n(),
  labelWidthMm: n(),
  labelHeightMm: n(),
  leftMm: n(),
  topMm: n(),
  gapXMm: n(),
  gapYMm: n(),
})

describe('absurd input', () => {
  it.each(Object.entries(calculations))('to %s gives null or plain numbers', (_name, calculation) =>
    expectPlainAnswers(calculation),
  )
})
