import { type FibreKind, fibreKinds, modalBandwidthMhzKm } from '../../../shared/calc/fibre/fibre.table.ts'
import { fibreLinkLossDb, lossSumDb } from '../../../shared/calc/fibre/linkLoss.ts'
import {
  fibreReachM,
  lrmMostLossDb,
  opticalKinds,
  sxReachByBandwidthM,
} from '../../../shared/calc/fibre/reach.table.ts'
import { type Answers, type FactAnswers, type Inputs, num, nums, oneOf, text } from './readInputs.ts'

const bandwidth = (i: Inputs, launch: 'overfilled' | 'effective') => {
  const fibre = oneOf(text(i, 'fibre'), fibreKinds)
  return fibre && isMultimode(fibre) ? modalBandwidthMhzKm[fibre][launch] : undefined
}
const isMultimode = (fibre: FibreKind): fibre is Exclude<FibreKind, 'OS2'> => fibre !== 'OS2'

export const fibreAnswers: Answers = {
  sum_list: (i) => lossSumDb(nums(i, 'values')),
  fibre_budget_db: (i) =>
    fibreLinkLossDb({
      lengthKm: num(i, 'length_km'),
      dbPerKm: num(i, 'db_per_km'),
      matedPairs: num(i, 'n_conn'),
      matedPairDb: num(i, 'db_conn'),
      splices: num(i, 'n_splice'),
      spliceDb: num(i, 'db_splice'),
    }),
}

export const fibreFacts: FactAnswers = [
  [
    /maximum reach/,
    (i) => {
      const [kind, fibre] = [oneOf(text(i, 'phy'), opticalKinds), oneOf(text(i, 'fibre'), fibreKinds)]
      if (kind && fibre) return fibreReachM(kind, fibre)
      const stated = /^62\.5.* (\d+) MHz/.exec(text(i, 'fibre'))?.[1]
      return kind === '1000BASE-SX' && stated ? sxReachByBandwidthM[Number(stated)] : undefined
    },
  ],
  [/channel insertion loss/, (i) => (text(i, 'phy') === '10GBASE-LRM' ? lrmMostLossDb : undefined)],
  [/overfilled modal bandwidth/, (i) => bandwidth(i, 'overfilled')],
  [/effective laser bandwidth/, (i) => bandwidth(i, 'effective')],
]
