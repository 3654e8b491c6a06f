import { areaResistanceOhmPerKm } from '../../../shared/calc/conductor/resistance.ts'
import {
  lumpedShare,
  mostTapsOf,
  mostTapsW,
  tapAtVoltageW,
  tapsTotalW,
} from '../../../shared/calc/speaker/constantVoltage.ts'
import { dampingAtSpeaker, loopForDampingOhm } from '../../../shared/calc/speaker/damping.ts'
import { inductiveCornerHz } from '../../../shared/calc/speaker/inductiveCorner.ts'
import { speakerLadder } from '../../../shared/calc/speaker/ladder.ts'
import { leastAreaMm2 } from '../../../shared/calc/speaker/leastArea.ts'
import {
  convertLoss,
  lineLoss,
  longestLineM,
  loopResistanceOhm,
  timesLonger,
} from '../../../shared/calc/speaker/lineLoss.ts'
import { heatWPerM, linePower, voltsForPower } from '../../../shared/calc/speaker/linePower.ts'
import { lineLoadOhm, parallelOhm, seriesOhm } from '../../../shared/calc/speaker/load.ts'
import { parallelSharesW, seriesParallelOhm, seriesSharesW } from '../../../shared/calc/speaker/sharing.ts'
import { type Answers, type Inputs, list, num, nums } from './readInputs.ts'
import { ftAsM, mAsFt, metresPerFoot, orNaN, perKm, scaled } from './units.ts'

/** Loop resistance and loss of a row given in feet. */
const loopFt = (i: Inputs) => loopResistanceOhm(ftAsM(num(i, 'length_ft')), perKm(num(i, 'r_ohm_kft')))
const lossFt = (i: Inputs) => lineLoss(orNaN(loopFt(i)), num(i, 'z'))
const lossOhm = (i: Inputs) => lineLoss(num(i, 'rc'), num(i, 'z'))
const powerOf = (i: Inputs) => linePower(num(i, 'v'), num(i, 'z'), num(i, 'rc'))
/** Load that a row's taps make on its constant-voltage line. */
const tapOhm = (i: Inputs, name = 'p_tap') => orNaN(lineLoadOhm(num(i, 'v_line'), num(i, name)))
const ratedVolts = (i: Inputs) => orNaN(voltsForPower(num(i, 'p_rated'), num(i, 'z_rated')))

export const speakerAnswers: Answers = {
  loop_r: (i) => loopResistanceOhm(num(i, 'length_m'), num(i, 'r_ohm_km'), num(i, 'conductors_per_leg', 1)),
  ratio_awg_ft: (i) => lossFt(i)?.impedance ?? null,
  il_db_awg_ft: (i) => lossFt(i)?.decibel ?? null,
  il_db_area_m: (i) => {
    const ohmPerKm = areaResistanceOhmPerKm(num(i, 'area_mm2'), num(i, 'rho_ohm_mm2_per_km'))
    const loopOhm = loopResistanceOhm(num(i, 'length_m'), orNaN(ohmPerKm))
    return lineLoss(orNaN(loopOhm), num(i, 'z'))?.decibel ?? null
  },
  il_db: (i) => lossOhm(i)?.decibel ?? null,
  rc_over_z_pct: (i) => lossOhm(i)?.impedance ?? null,
  cable_share_pct: (i) => lossOhm(i)?.voltage ?? null,
  spk_power_loss_pct: (i) => lossOhm(i)?.power ?? null,
  ratio_to_db: (i) => convertLoss(num(i, 'ratio_pct'), 'impedance', 'decibel'),
  db_to_ratio_pct: (i) => convertLoss(num(i, 'loss_db'), 'decibel', 'impedance'),
  db_to_power_pct: (i) => convertLoss(num(i, 'loss_db'), 'decibel', 'power'),
  db_len_multiplier: (i) => timesLonger(num(i, 'db_a'), num(i, 'db_b')),
  damping: (i) => dampingAtSpeaker(num(i, 'z'), num(i, 'z_out'), num(i, 'rc')),
  rc_for_damping: (i) => loopForDampingOhm(num(i, 'z'), num(i, 'df_system'), num(i, 'df_amp')),
  amp_power_into_line: (i) => powerOf(i)?.amplifierW ?? null,
  cable_power: (i) => powerOf(i)?.cableW ?? null,
  speaker_power: (i) => powerOf(i)?.speakerW ?? null,
  volts_for_power: (i) => voltsForPower(num(i, 'p_w'), num(i, 'z')),
  i2r_per_ft: (i) =>
    scaled(heatWPerM(num(i, 'p_w'), num(i, 'z'), num(i, 'r_loop_per_ft') / metresPerFoot), metresPerFoot),
  z_parallel: (i) => parallelOhm(nums(i, 'z_list')),
  z_series: (i) => seriesOhm(nums(i, 'z_list')),
  z_series_parallel: (i) =>
    seriesParallelOhm(list(i, 'branches').map((branch) => (Array.isArray(branch) ? branch.map(Number) : []))),
  share_parallel_w: (i) => parallelSharesW(ratedVolts(i), nums(i, 'z_list'))?.[num(i, 'index')] ?? null,
  share_series_w: (i) => seriesSharesW(ratedVolts(i), nums(i, 'z_list'))?.[num(i, 'index')] ?? null,
  l_rolloff_hz: (i) =>
    inductiveCornerHz(num(i, 'z'), ftAsM(num(i, 'length_ft')), num(i, 'l_uH_per_ft') / metresPerFoot),
  max_len_ratio_ft: (i) =>
    mAsFt(longestLineM(num(i, 'ratio_pct'), 'impedance', num(i, 'z'), perKm(num(i, 'r_ohm_kft')))),
  max_len_ratio_m: (i) => longestLineM(num(i, 'ratio_pct'), 'impedance', num(i, 'z'), num(i, 'r_ohm_km')),
  max_len_db_ft: (i) => mAsFt(longestLineM(num(i, 'loss_db'), 'decibel', num(i, 'z'), perKm(num(i, 'r_ohm_kft')))),
  max_len_db_m: (i) => longestLineM(num(i, 'loss_db'), 'decibel', num(i, 'z'), num(i, 'r_ohm_km')),
  cv_z: (i) => lineLoadOhm(num(i, 'v_line'), num(i, 'p_w')),
  cv_total: (i) => {
    const counts = nums(i, 'counts')
    return tapsTotalW(nums(i, 'taps').map((tapW, place) => ({ tapW, count: counts[place] ?? Number.NaN })))
  },
  cv_max_load: (i) => mostTapsW(num(i, 'p_amp'), num(i, 'fraction')),
  cv_max_count: (i) => mostTapsOf(num(i, 'p_amp'), num(i, 'tap_w'), num(i, 'fraction')),
  cv_tap_at_other_voltage: (i) => tapAtVoltageW(num(i, 'tap_w'), num(i, 'v_tap'), num(i, 'v_line')),
  cv_load_power: (i) => linePower(num(i, 'v_line'), tapOhm(i), num(i, 'rc'))?.speakerW ?? null,
  cv_loss_db: (i) => lineLoss(num(i, 'rc'), tapOhm(i))?.decibel ?? null,
  cv_max_len_m: (i) => longestLineM(num(i, 'loss_db'), 'decibel', tapOhm(i), num(i, 'r_ohm_km')),
  cv_area_mm2: (i) =>
    leastAreaMm2(
      num(i, 'length_m'),
      tapOhm(i, 'p_w'),
      num(i, 'share_pct'),
      'voltage',
      // The row gives out and back together, in ohm mm2/m.
      (num(i, 'rho2_ohm_mm2_per_m') / 2) * 1000,
    ),
  eq_len_factor: (i) => lumpedShare(num(i, 'n')),
  ladder_last_db: (i) => {
    const lengths = nums(i, 'seg_m')
    const sections = nums(i, 'taps').map((tapW, place) => ({
      loopOhm: orNaN(loopResistanceOhm(lengths[place] ?? Number.NaN, num(i, 'r_ohm_km'))),
      loadOhm: lineLoadOhm(num(i, 'v_line'), tapW),
    }))
    return speakerLadder(sections)?.lossDb.at(-1) ?? null
  },
}
