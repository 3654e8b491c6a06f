import { isPullWithinCode, isPullWithinTelecom } from '../../../shared/calc/pathway/bends.ts'
import { cablesAreaIn2, fillPercent, summedAreaIn2 } from '../../../shared/calc/pathway/cableArea.ts'
import { cablesInRaceway } from '../../../shared/calc/pathway/cablesInRaceway.ts'
import { allowedFillIn2 } from '../../../shared/calc/pathway/fillLimit.ts'
import { doesCodeLimitFill, type FillCableKind } from '../../../shared/calc/pathway/fillRule.ts'
import { jamRatio, mayJam } from '../../../shared/calc/pathway/jam.ts'
import { anglePullBoxIn, straightPullBoxIn } from '../../../shared/calc/pathway/pullBox.ts'
import { entAlternativeAreasIn2, racewayKinds, tradeSizes } from '../../../shared/calc/pathway/raceway.table.ts'
import { racewayBendRadiusIn } from '../../../shared/calc/pathway/racewayBend.ts'
import { boreAreaIn2, racewayBore } from '../../../shared/calc/pathway/racewayBore.ts'
import { reducedCount, reducedSize } from '../../../shared/calc/pathway/reducedCount.ts'
import { smallestRaceway } from '../../../shared/calc/pathway/smallestRaceway.ts'
import { type Answers, byWords, feet, type Inputs, num, nums, oneOf, pairs, text } from './readInputs.ts'

const size = (i: Inputs) => oneOf(text(i, 'size'), tradeSizes)
const kind = (i: Inputs) => oneOf(text(i, 'type').replace(/ ?(sch\.? ?)?(40|80)$/i, '$2'), racewayKinds)

/** The product's own table wherever it has the raceway, so that the row tries the table as well. */
function bore(i: Inputs): number {
  const [raceway, trade] = [kind(i), size(i)]
  if (trade === undefined) return num(i, 'area')
  if (raceway === undefined) return entAlternativeAreasIn2.get(trade) ?? num(i, 'area')
  return racewayBore(raceway, trade)?.areaIn2 ?? Number.NaN
}

const fillCables: readonly (readonly [RegExp, FillCableKind])[] = [
  [/class ?[23]|cl[23]/i, 'class 2 or 3'],
  [/non-?conductive/i, 'fibre, non-conductive'],
  [/conductive/i, 'fibre, conductive'],
  [/fib/i, 'fibre, non-conductive'],
  [/coax|catv/i, 'coaxial'],
  [/commun|data|cmr|utp/i, 'communications'],
  [/power|thhn|building|conductor/i, 'power'],
]

export const pathwayAnswers: Answers = {
  area_from_id: (i) => boreAreaIn2(num(i, 'id')),
  fill_area: (i) => allowedFillIn2(num(i, 'area'), num(i, 'n'), i['nipple'] === true),
  mixed_total: (i) => summedAreaIn2(pairs(i, 'items').map(([cables, areaIn2]) => ({ cables, areaIn2 }))),
  mixed_od: (i) => cablesAreaIn2(pairs(i, 'items').map(([cables, outerDiameterIn]) => ({ cables, outerDiameterIn }))),
  max_cables: (i) => cablesInRaceway(bore(i), num(i, 'od')),
  mil_chart: (i) => {
    const trade = size(i)
    return trade && reducedCount(trade, num(i, 'od_mm'))
  },
  mil_size: (i) => reducedSize(num(i, 'n'), num(i, 'od_mm')),
  min_size: (i) => {
    const raceway = kind(i)
    return raceway && smallestRaceway(raceway, { cablesIn2: num(i, 'total'), cables: num(i, 'n') })
  },
  fill_pct: (i) => fillPercent(num(i, 'total'), num(i, 'area')),
  jam: (i) => jamRatio(num(i, 'id'), num(i, 'od')),
  jam_warn: (i) => mayJam(num(i, 'id'), num(i, 'od'), num(i, 'n')),
  pull_tia: (i) => isPullWithinTelecom(nums(i, 'bends'), feet(num(i, 'length_ft'))),
  pull_nec: (i) => isPullWithinCode(nums(i, 'bends')),
  pullbox_straight: (i) => straightPullBoxIn(num(i, 'D')),
  pullbox_angle: (i) => anglePullBoxIn(num(i, 'D'), nums(i, 'others')),
  conduit_radius: (i) => racewayBendRadiusIn(num(i, 'id')),
  nec_fill_applies: (i) => {
    const cable = byWords(text(i, 'cable'), fillCables)
    return cable && doesCodeLimitFill(cable)
  },
}
