import {
  awgAreaCmil,
  awgAreaMm2,
  awgDiameterIn,
  awgDiameterMm,
  awgInParallel,
  awgOfAreaMm2,
  awgOfCount,
} from '../../../shared/calc/conductor/awg.ts'
import { iecMaximumOhmPerKm, smallBunchedOhmPerKm } from '../../../shared/calc/conductor/iec60228.table.ts'
import { kFactorOhmCmilPerFt } from '../../../shared/calc/conductor/kFactor.ts'
import { necOhmPerKm75 } from '../../../shared/calc/conductor/necTable8.table.ts'
import {
  awgResistanceOhmPerKm,
  copperCladPenaltyPercent,
  resistanceAt,
  strandedResistance,
  timesAsMuch,
} from '../../../shared/calc/conductor/resistance.ts'
import { coefficientAt, factorTo20, resistanceFrom75 } from '../../../shared/calc/conductor/temperature.ts'
import { type Answers, type FactAnswers, num, nums, text } from './readInputs.ts'
import { metresPerFoot, scaled } from './units.ts'

export const conductorAnswers: Answers = {
  awg_diameter_mm: (i) => awgDiameterMm(num(i, 'awg')),
  awg_diameter_in: (i) => awgDiameterIn(num(i, 'awg')),
  awg_area_mm2: (i) => awgAreaMm2(num(i, 'awg')),
  awg_area_cmil: (i) => awgAreaCmil(num(i, 'awg')),
  r_awg_ohm_kft: (i) => scaled(awgResistanceOhmPerKm(num(i, 'awg')), metresPerFoot),
  r_awg_ohm_km: (i) => awgResistanceOhmPerKm(num(i, 'awg')),
  r_at_temp: (i) => resistanceAt(num(i, 'r20'), num(i, 'temp_C'), num(i, 'alpha_per_K')),
  r_from_75: (i) => resistanceFrom75(num(i, 'r75'), num(i, 'temp_C'), num(i, 'alpha75_per_K')),
  alpha_shift: (i) => coefficientAt(num(i, 'alpha20'), num(i, 'ref_C')),
  kt_to_20: (i) => factorTo20(num(i, 'temp_C'), num(i, 'coef_per_K')),
  product: (i) => strandedResistance(num(i, 'a'), num(i, 'b')),
  ratio: (i) => timesAsMuch(num(i, 'a'), num(i, 'b')),
  mm2_to_awg: (i) => awgOfAreaMm2(num(i, 'area_mm2')),
  awg_parallel: (i) => awgOfCount(num(i, 'awg'), num(i, 'count')),
  awg_sum: (i) => awgInParallel(nums(i, 'awg_list')),
  k_const_ohm_cmil_ft: (i) => kFactorOhmCmilPerFt(num(i, 'rho_ohm_mm2_per_km')),
}

export const conductorFacts: FactAnswers = [
  [
    /IEC 60228 maximum/,
    (i) => iecMaximumOhmPerKm(num(i, 'area_mm2'), text(i, 'cls') === '1/2' ? 'class 1/2' : 'class 5/6'),
  ],
  [/VDE 0295/, (i) => smallBunchedOhmPerKm(num(i, 'area_mm2'))],
  [
    /NEC.*Table 8/i,
    (i) =>
      scaled(
        necOhmPerKm75(
          num(i, 'awg'),
          text(i, 'finish') === 'coated' ? 'coated' : 'uncoated',
          text(i, 'stranding') === 'solid' ? 'solid' : 'stranded',
        ),
        metresPerFoot,
      ),
  ],
  [/CCA penalty/, () => copperCladPenaltyPercent],
]
