import { crewDays, factoredHours, hoursByLength, labourHours } from '../../../shared/calc/labour/labourHours.ts'
import { firstFitDecreasing, firstFitGuarantee } from '../../../shared/calc/spool/firstFitDecreasing.ts'
import { leastSpools } from '../../../shared/calc/spool/leastSpools.ts'
import { isTooLong } from '../../../shared/calc/spool/isTooLong.ts'
import { spoolsByMartelloToth, spoolsByTotal } from '../../../shared/calc/spool/spoolBounds.ts'
import { mmToFeet } from '../../../shared/units.ts'
import { type Answers, feet, metres, num, nums, pairs } from './readInputs.ts'

export const spoolAnswers: Answers = {
  bins_opt: (i) => leastSpools(nums(i, 'items'), num(i, 'capacity'))?.spools.length,
  ffd: (i) => firstFitDecreasing(nums(i, 'items'), num(i, 'capacity'))?.length,
  l1: (i) => spoolsByTotal(nums(i, 'items'), num(i, 'capacity')),
  l2: (i) => spoolsByMartelloToth(nums(i, 'items'), num(i, 'capacity')),
  ffd_bound: (i) => firstFitGuarantee(num(i, 'opt')),
  m_ft: (i) => mmToFeet(metres(num(i, 'm'))),
  too_long: (i) => isTooLong(num(i, 'item'), num(i, 'capacity')),
  labour: (i) => labourHours(pairs(i, 'units').map(([quantity, hoursEach]) => ({ quantity, hoursEach }))),
  labour_mult: (i) => factoredHours(num(i, 'h'), num(i, 'factor')),
  crew_days: (i) => crewDays(num(i, 'h'), num(i, 'crew')),
  labour_per_len: (i) => hoursByLength(feet(num(i, 'ft')), num(i, 'u')),
}
