import { averagedTotalMm } from '../../../shared/calc/length/averageLength.ts'
import { boxesByRuns, boxesByTotal } from '../../../shared/calc/length/boxCount.ts'
import { framingDetour } from '../../../shared/calc/length/framingDetour.ts'
import { markDifference, pulledLengthMm } from '../../../shared/calc/length/jacketMarks.ts'
import { isWithinLink } from '../../../shared/calc/length/linkLimit.ts'
import { orderLengthMm, outsidePlantLengthMm, roundUpToStepMm } from '../../../shared/calc/length/orderQuantity.ts'
import { overheadLengthMm } from '../../../shared/calc/length/overheadLength.ts'
import { readMark } from '../../../shared/calc/length/remainingMark.ts'
import { storeyLengthMm } from '../../../shared/calc/length/storeyLength.ts'
import { storedSlackMm } from '../../../shared/calc/length/storedSlack.ts'
import { underfloorLengthMm } from '../../../shared/calc/length/underfloorLength.ts'
import { framedWallHeightIn } from '../../../shared/calc/length/wallHeight.ts'
import { type Answers, byWords, feet, inFeet, inMetres, type Inputs, metres, num, text } from './readInputs.ts'

const ft = (inputs: Inputs, name: string, otherwise?: number) => feet(num(inputs, name, otherwise))
const m = (inputs: Inputs, name: string) => metres(num(inputs, name))
const ends = (i: Inputs) => ({
  alongXMm: ft(i, 'dx'),
  alongYMm: ft(i, 'dy'),
  slackBoxMm: ft(i, 'sbox'),
  slackHeadMm: ft(i, 'shead'),
})

export const lengthAnswers: Answers = {
  attic: (i) =>
    inFeet(
      overheadLengthMm({
        ...ends(i),
        ceilingHeightMm: ft(i, 'H'),
        boxHeightMm: ft(i, 'hbox'),
        headHeightMm: ft(i, 'hhead'),
        overheadMm: ft(i, 'overhead', 0),
      }),
    ),
  crawl: (i) =>
    inFeet(
      underfloorLengthMm({
        ...ends(i),
        boxHeightMm: ft(i, 'hbox'),
        headHeightMm: ft(i, 'hhead'),
        floorThicknessMm: ft(i, 't'),
      }),
    ),
  storey: (i) =>
    inFeet(
      storeyLengthMm({
        ...ends(i),
        lowerCeilingHeightMm: ft(i, 'Hlower'),
        headHeightMm: ft(i, 'hhead'),
        floorDepthMm: ft(i, 'floor_depth'),
        upperBoxHeightMm: ft(i, 'hbox_upper'),
      }),
    ),
  waste: (i) => inFeet(orderLengthMm(ft(i, 'L'), num(i, 'w'), feet(1))),
  roundup: (i) => inFeet(roundUpToStepMm(ft(i, 'L'), ft(i, 'step'))),
  osp: (i) => inMetres(outsidePlantLengthMm(m(i, 'path'), m(i, 'ends'), num(i, 'pct'))),
  avgmethod: (i) =>
    inMetres(
      averagedTotalMm({
        shortestMm: m(i, 'A'),
        longestMm: m(i, 'B'),
        slackMm: m(i, 'S'),
        dropMm: m(i, 'D'),
        runs: num(i, 'N'),
      }),
    ),
  slack: (i) => {
    const medium = byWords(text(i, 'medium'), [
      [/fib/i, 'optical fibre'],
      [/pair|utp|copper/i, 'twisted pair'],
    ] as const)
    return medium && inMetres(storedSlackMm(medium))
  },
  marks: (i) =>
    markDifference(num(i, 'start'), num(i, 'end'), i['mod'] === null || i['mod'] === undefined ? null : num(i, 'mod')),
  marks_m: (i) => inFeet(pulledLengthMm({ start: num(i, 'start'), end: num(i, 'end'), unit: 'm', counter: null })),
  remaining: (i) => readMark(text(i, 'legend'), 'ft')?.value,
  limit90: (i) => isWithinLink(m(i, 'path'), m(i, 'slack')),
  runs_per_box: (i) => boxesByRuns(ft(i, 'box'), ft(i, 'avg'), num(i, 'N')),
  total_rule: (i) => boxesByTotal(ft(i, 'box'), ft(i, 'avg'), num(i, 'N')),
  manh_ratio: (i) => framingDetour(num(i, 'dx'), num(i, 'dy')),
  wallheight: (i) => framedWallHeightIn(num(i, 'stud'), num(i, 'plates')),
}
