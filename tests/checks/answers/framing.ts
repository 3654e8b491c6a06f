import { largestJoistHoleIn } from '../../../shared/calc/framing/joistHole.ts'
import { largestJoistNotch } from '../../../shared/calc/framing/joistNotch.ts'
import { needsNailPlate } from '../../../shared/calc/framing/nailPlate.ts'
import { largestStudHoleIn } from '../../../shared/calc/framing/studHole.ts'
import { type Answers, num } from './readInputs.ts'

export const framingAnswers: Answers = {
  stud_hole: (i) => largestStudHoleIn({ depthIn: num(i, 'depth'), isBearing: i['bearing'] === true }),
  joist_hole: (i) => largestJoistHoleIn(num(i, 'depth')),
  joist_notch: (i) => largestJoistNotch(num(i, 'depth'), i['end'] === true)?.depthIn,
  nail_plate: (i) => needsNailPlate(num(i, 'depth'), num(i, 'hole')),
}
