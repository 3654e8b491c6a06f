import { areaOfDiameterMm2 } from '../../../shared/calc/conductor/awg.ts'
import { areaResistanceOhmPerKm } from '../../../shared/calc/conductor/resistance.ts'
import { class2MostA } from '../../../shared/calc/power/class2.ts'
import { class2Limits } from '../../../shared/calc/power/class2.table.ts'
import { canFeed, constantPowerSupply, mostLoadW } from '../../../shared/calc/power/constantPower.ts'
import { longestAtPercentM } from '../../../shared/calc/power/longestAtPercent.ts'
import { evenlySpreadDropV } from '../../../shared/calc/power/spreadLoad.ts'
import {
  dropByKFactorV,
  dropPercent,
  longestAtDropM,
  longestAtLegDropM,
  voltageDropV,
} from '../../../shared/calc/power/voltageDrop.ts'
import { type Answers, type FactAnswers, type Inputs, num } from './readInputs.ts'
import { ftAsM, mAsFt, orNaN, perKm } from './units.ts'

const supply = (i: Inputs) => constantPowerSupply(num(i, 'v_src'), num(i, 'r'), num(i, 'p_load'))
const kft = (i: Inputs) => perKm(num(i, 'r_ohm_kft'))
const drop = (i: Inputs) => voltageDropV(num(i, 'length_m'), num(i, 'r_ohm_km'), num(i, 'i_a'))

export const powerAnswers: Answers = {
  cp_i: (i) => supply(i)?.currentA ?? null,
  cp_v: (i) => supply(i)?.loadV ?? null,
  cp_psrc: (i) => supply(i)?.sourceW ?? null,
  cp_loss: (i) => supply(i)?.lossW ?? null,
  cp_pmax: (i) => mostLoadW(num(i, 'v_src'), num(i, 'r')),
  cp_possible: (i) => canFeed(num(i, 'v_src'), num(i, 'r'), num(i, 'p_load')),
  vdrop: drop,
  vdrop_ft: (i) => voltageDropV(ftAsM(num(i, 'length_ft')), kft(i), num(i, 'i_a')),
  vdrop_pct: (i) => dropPercent(orNaN(drop(i)), num(i, 'v')),
  vdrop_nec_k: (i) =>
    dropByKFactorV(num(i, 'k_ohm_cmil_ft'), ftAsM(num(i, 'length_ft')), num(i, 'i_a'), num(i, 'cmil')),
  max_len_vdrop_ft: (i) => mAsFt(longestAtDropM(num(i, 'v_drop'), kft(i), num(i, 'i_a'))),
  one_leg_len_ft: (i) => mAsFt(longestAtLegDropM(num(i, 'v_drop_leg'), kft(i), num(i, 'i_a'))),
  max_len_va_ft: (i) =>
    mAsFt(
      longestAtPercentM(
        num(i, 'pct'),
        { sourceV: num(i, 'v'), powerW: num(i, 'va'), kind: 'constant current' },
        kft(i),
      ),
    ),
  max_len_cp_m: (i) =>
    longestAtPercentM(
      num(i, 'pct'),
      { sourceV: num(i, 'v'), powerW: num(i, 'p_w'), kind: 'constant power' },
      orNaN(areaResistanceOhmPerKm(orNaN(areaOfDiameterMm2(num(i, 'd_mm'))), num(i, 'rho_ohm_mm2_per_km'))),
    ),
  class2_max_current: (i) => class2MostA(num(i, 'v'), num(i, 'limit_va'), num(i, 'cap_a')),
  end_drop_uniform: (i) => evenlySpreadDropV(num(i, 'length_m'), num(i, 'r_ohm_km'), num(i, 'i_total')),
}

export const powerFacts: FactAnswers = [[/Class 2 limit/, () => class2Limits.mostVa]]
