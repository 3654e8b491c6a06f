import { administrationClass } from '../../../shared/calc/administration/administrationClass.ts'
import { fieldColours, type TerminationField } from '../../../shared/calc/administration/fieldColour.table.ts'
import { isLabelNearEnd } from '../../../shared/calc/administration/labelPlace.ts'
import { isLinkIdentifier } from '../../../shared/calc/administration/linkIdentifier.ts'
import { cablesForGrade, type ResidentialGrade } from '../../../shared/calc/administration/residentialGrade.ts'
import { outletsForWall } from '../../../shared/calc/administration/wallOutlets.ts'
import { symbolColours, type SymbolCategory } from '../../../shared/calc/symbol/symbolColour.table.ts'
import { symbolExtentMm } from '../../../shared/calc/symbol/symbolExtent.ts'
import { type Answers, byWords, feet, type Inputs, num, text } from './readInputs.ts'

const fields: readonly (readonly [RegExp, TerminationField])[] = [
  [/demarc/i, 'demarcation'],
  [/network/i, 'network connection'],
  [/common/i, 'common equipment'],
  [/first|level 1/i, 'first-level backbone'],
  [/second|level 2/i, 'second-level backbone'],
  [/horizontal/i, 'horizontal'],
  [/inter-?building|campus/i, 'inter-building backbone'],
  [/aux|alarm/i, 'auxiliary or alarm'],
  [/key|reserved/i, 'key telephone'],
]
const categories: readonly (readonly [RegExp, SymbolCategory])[] = [
  [/audio|video/i, 'audio video'],
  [/commun/i, 'communications'],
  [/safety|security/i, 'safety and security'],
]
const gradeOf = (i: Inputs) => ([1, 2] as const).find((grade: ResidentialGrade) => grade === num(i, 'grade'))

export const administrationAnswers: Answers = {
  link_id: (i) => isLinkIdentifier(text(i, 'id')),
  admin_class: (i) =>
    administrationClass({ telecomSpaces: num(i, 'rooms'), buildings: num(i, 'buildings'), sites: num(i, 'sites') }),
  field_colour: (i) => {
    const field = byWords(text(i, 'field'), fields)
    return field && fieldColours[field]
  },
  label_pos: (i) => isLabelNearEnd(num(i, 'distance_mm')),
  grade: (i) => {
    const grade = gradeOf(i)
    const cables = grade && cablesForGrade(grade, 1)
    return cables && [cables.twistedPair, cables.coaxial, `optional ${cables.optionalFibre}`]
  },
  grade_total: (i) => {
    const grade = gradeOf(i)
    const cables = grade && cablesForGrade(grade, num(i, 'rooms'))
    return cables && [cables.twistedPair, cables.coaxial]
  },
  wall_outlets: (i) => outletsForWall(feet(num(i, 'wall_ft'))),
  sym_colour: (i) => {
    const category = byWords(text(i, 'category'), categories)
    return category && symbolColours[category]
  },
  sym_scale: (i) => symbolExtentMm(num(i, 'size_mm'), num(i, 'scale')),
}
