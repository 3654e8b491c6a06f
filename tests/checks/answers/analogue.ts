import { dbuOfDbv, voltsOfDbu } from '../../../shared/calc/analogue/audioLevel.ts'
import {
  cornerHz,
  longestAtCapacitanceM,
  longestAtLossM,
  lowPassLossDb,
} from '../../../shared/calc/analogue/capacitance.ts'
import { dmxRefreshHz, longestAtRateM, unitLoadsOhm } from '../../../shared/calc/analogue/serial.ts'
import { serialLimits } from '../../../shared/calc/analogue/serial.table.ts'
import { endOfLineOhm, longestZoneM, zoneWireM } from '../../../shared/calc/analogue/supervisedLoop.ts'
import { type Answers, num } from './readInputs.ts'
import { mAsFt, perKm } from './units.ts'

export const analogueAnswers: Answers = {
  // Capacitance and length of these rows are by the same unit, feet or metres, which then drops out.
  rc_cutoff_len_hz: (i) => cornerHz(num(i, 'r_ohm'), num(i, 'length'), num(i, 'c_pf_per_len')),
  rc_len_for_db: (i) => longestAtLossM(num(i, 'loss_db'), num(i, 'r_ohm'), num(i, 'f_hz'), num(i, 'c_pf_per_len')),
  cap_len: (i) => longestAtCapacitanceM(num(i, 'c_max_pf'), num(i, 'c_pf_per_len')),
  rc_loss_db: (i) => lowPassLossDb(num(i, 'r_ohm'), num(i, 'c_pf'), num(i, 'f_hz')),
  rate_len_m: (i) => longestAtRateM(num(i, 'product_bps_m'), num(i, 'rate_bps')),
  unit_load_ohm: (i) => unitLoadsOhm(num(i, 'n'), num(i, 'ul_ohm')),
  dmx_refresh_hz: (i) =>
    dmxRefreshHz({
      slots: num(i, 'slots'),
      slotUs: num(i, 'slot_us'),
      breakUs: num(i, 'break_us'),
      markUs: num(i, 'mab_us'),
    }),
  loop_len_oneway_ft: (i) => mAsFt(longestZoneM(num(i, 'r_max'), perKm(num(i, 'r_ohm_kft')))),
  loop_len_total_ft: (i) => mAsFt(zoneWireM(num(i, 'r_max'), perKm(num(i, 'r_ohm_kft')))),
  eol_state_ohm: (i) => endOfLineOhm(num(i, 'r_eol'), num(i, 'n_series')),
  dbu_to_v: (i) => voltsOfDbu(num(i, 'dbu')),
  dbv_to_dbu: (i) => dbuOfDbv(num(i, 'dbv')),
}

/** Limits by what rows call them. */
export const analogueLimitNames: readonly (readonly [RegExp, number])[] = [
  [/dmx.*device|unit_?loads?$/i, serialLimits.unitLoads],
  [/dmx.*rate/i, serialLimits.dmxBitsPerSecond],
  [/terminat/i, serialLimits.terminationOhm],
  [/dmx.*(plan|practic)/i, serialLimits.dmxPlannedM],
  [/dmx.*abs/i, serialLimits.dmxAbsoluteM],
  [/dmx.*_m$/i, serialLimits.dmxFixtureManualsM],
  [/rs485.*_m$/i, serialLimits.rs485LongestM],
  [/rs232.*ft/i, serialLimits.rs232NominalFt],
  [/rs232.*pf/i, serialLimits.rs232MostPf],
  [/unit_?load.*ohm/i, serialLimits.unitLoadOhm],
]
