import {
  attenuationBetween,
  attenuationByRoot,
  coaxDbPer100M,
  coaxLossDb,
  dbPer100MOf,
} from '../../../shared/calc/coax/attenuation.ts'
import { coaxKinds, compositeRunFt } from '../../../shared/calc/coax/attenuation.table.ts'
import { impliedDbPer100M, longestAtBudgetM, longestPastSplitM } from '../../../shared/calc/coax/budgetLength.ts'
import { dbmOfDbmv, dbmvOfMillivolts, dbuvOfDbmv } from '../../../shared/calc/coax/level.ts'
import { outletLevelDbmv } from '../../../shared/calc/coax/level.table.ts'
import { sdiBudgetDb, sdiMbps, type SdiKind } from '../../../shared/calc/coax/sdi.table.ts'
import { idealSplitDb, levelAfter } from '../../../shared/calc/coax/splitter.ts'
import { type Splitter, splitterLossDb } from '../../../shared/calc/coax/splitter.table.ts'
import { type Answers, byWords, type FactAnswers, type Inputs, num, nums, text } from './readInputs.ts'
import { metresPerFoot, scaled } from './units.ts'

/** RG6, RG-6 and RG 6 alike. */
const kindOf = (name: string) =>
  coaxKinds.find((kind) => kind.replace('-', '') === name.replace(/[- ]/g, '').toUpperCase())
const sdiKinds: readonly (readonly [RegExp, SdiKind])[] = [
  [/^12G/, '12G'],
  [/^6G/, '6G'],
  [/^3G/, '3G'],
  [/^HD/, 'HD'],
  [/^SD/, 'SD'],
]
const levels: readonly (readonly [RegExp, number])[] = [
  [/64-QAM min/i, outletLevelDbmv.qam64Least],
  [/256-QAM min/i, outletLevelDbmv.qam256Least],
  [/max/i, outletLevelDbmv.qamMost],
]
/** One loss where all ports have the same. */
const splitterFact = (i: Inputs) => {
  const ports: readonly number[] | undefined = splitterLossDb[text(i, 'splitter').split(' ')[0] as Splitter]
  return ports?.length === 1 ? ports[0] : ports
}

export const coaxAnswers: Answers = {
  coax_sqrt_scale: (i) => attenuationByRoot(num(i, 'alpha_ref'), num(i, 'f_ref_mhz'), num(i, 'f_mhz')),
  coax_interp_sqrt: (i) =>
    attenuationBetween(
      { mhz: num(i, 'f1'), attenuation: num(i, 'a1') },
      { mhz: num(i, 'f2'), attenuation: num(i, 'a2') },
      num(i, 'f_mhz'),
    ),
  db100ft_to_db100m: (i) => dbPer100MOf(num(i, 'alpha')),
  // Attenuation and length of these rows are by the same unit, feet or metres, which then drops out.
  coax_loss_db: (i) => coaxLossDb(num(i, 'alpha_db_100'), num(i, 'length')),
  coax_budget_len: (i) => longestAtBudgetM(num(i, 'budget_db'), num(i, 'alpha_db_100')),
  coax_budget_len_split: (i) =>
    longestPastSplitM({
      budgetDb: num(i, 'budget_db'),
      splitDb: num(i, 'split_db'),
      nearM: num(i, 'near_len'),
      nearDbPer100M: num(i, 'near_alpha_100'),
      dbPer100M: num(i, 'alpha_100'),
    }),
  implied_alpha_100ft: (i) => scaled(impliedDbPer100M(num(i, 'budget_db'), num(i, 'length_m')), metresPerFoot),
  splitter_ideal_db: (i) => idealSplitDb(num(i, 'n')),
  level_out: (i) => levelAfter(num(i, 'level_in'), nums(i, 'losses')),
  dbmv_to_dbuv: (i) => dbuvOfDbmv(num(i, 'dbmv')),
  dbmv_to_dbm: (i) => dbmOfDbmv(num(i, 'dbmv'), num(i, 'z')),
  mv_to_dbmv: (i) => dbmvOfMillivolts(num(i, 'mv')),
}

export const coaxFacts: FactAnswers = [
  [/splitter through loss/, splitterFact],
  [/analogue minimum/, () => outletLevelDbmv.analogueLeast],
  [/digital level window/, (i) => byWords(text(i, 'key'), levels)],
  [/loss budget at half clock/, () => [sdiBudgetDb.upToThreeG, sdiBudgetDb.fromSixG]],
  [
    /serial rate/,
    (i) => {
      const kind = byWords(text(i, 'format'), sdiKinds)
      return kind && sdiMbps[kind]
    },
  ],
  [
    /composite video run/,
    (i) => {
      const kind = kindOf(text(i, 'cable'))
      return kind && compositeRunFt[kind]
    },
  ],
  [
    /attenuation/,
    (i) => {
      const kind = kindOf(text(i, 'cable'))
      return kind && scaled(coaxDbPer100M(kind, num(i, 'f_mhz', num(i, 'mhz'))), metresPerFoot)
    },
  ],
]
