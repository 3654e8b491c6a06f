import { mayReplace } from '../../../shared/calc/jacket/mayReplace.ts'
import { mayCrossReturnAir } from '../../../shared/calc/jacket/returnAirCrossing.ts'
import { spaceFit } from '../../../shared/calc/jacket/spaceFit.ts'
import { listedMarkings } from '../../../shared/calc/jacket/substitution.table.ts'
import { entranceLengthMm, mayEnterUnlisted } from '../../../shared/calc/jacket/unlistedEntrance.ts'
import { spaceClasses } from '../../../shared/model/place.ts'
import { type Answers, feet, inches, inFeet, num, oneOf, text } from './readInputs.ts'

export const jacketAnswers: Answers = {
  substitute: (i) => {
    const [have, need] = [
      oneOf(text(i, 'have'), [...listedMarkings, 'none'] as const),
      oneOf(text(i, 'need'), listedMarkings),
    ]
    return have && need && mayReplace(have, need)
  },
  space_ok: (i) => {
    const [marking, space] = [
      oneOf(text(i, 'cable'), [...listedMarkings, 'none'] as const),
      oneOf(text(i, 'space'), spaceClasses),
    ]
    const occupancy = i['one_two_family'] === true ? 'one or two family' : 'other'
    return marking && space && spaceFit({ marking, space, occupancy, outerDiameterMm: inches(num(i, 'od')) })?.fits
  },
  unlisted50: (i) => {
    const space = oneOf(text(i, 'space'), spaceClasses)
    return (
      space && mayEnterUnlisted({ lengthMm: feet(num(i, 'length_ft')), isTerminated: i['terminated'] === true, space })
    )
  },
  entrance_shift: (i) => inFeet(entranceLengthMm(feet(num(i, 'path_inside')), feet(num(i, 'in_bonded_rmc')))),
  dwelling_joist: (i) => mayCrossReturnAir(text(i, 'direction') === 'along' ? 'along' : 'across'),
}
