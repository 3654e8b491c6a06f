import { poeClasses, poeClassPower, poeTypeLimits, poeTypes } from '../../../shared/calc/poe/poe.table.ts'
import { poeChannelOhm, poeDelivery } from '../../../shared/calc/poe/poeChannel.ts'
import { poeClassFor } from '../../../shared/calc/poe/poeClassFor.ts'
import { type Answers, type FactAnswers, type Inputs, num } from './readInputs.ts'

const delivery = (i: Inputs) => poeDelivery(num(i, 'p_pse'), num(i, 'v_pse'), num(i, 'r', 0))
const classOf = (i: Inputs) => poeClasses.find((name) => name === num(i, 'pd_class'))

export const poeAnswers: Answers = {
  // Rows write 0 where no class covers the load.
  poe_class: (i) => poeClassFor(num(i, 'p_pd')) ?? 0,
  poe_r: (i) => {
    const pairs = ([2, 4] as const).find((count) => count === num(i, 'pairs'))
    return pairs && poeChannelOhm(num(i, 'length_m'), num(i, 'r_conductor_ohm_km'), pairs)
  },
  poe_fwd_i: (i) => delivery(i)?.currentA ?? null,
  poe_fwd_vpd: (i) => delivery(i)?.deviceV ?? null,
  poe_fwd_ppd: (i) => delivery(i)?.deviceW ?? null,
}

/** One limit of every type; N in the pattern is the type. */
const typeNamed = (pattern: string, key: 'mostA' | 'sourceLeastV' | 'deviceLeastV') =>
  poeTypes.map((type) => [new RegExp(pattern.replaceAll('N', String(type)), 'i'), poeTypeLimits[type][key]] as const)

/** Limits by what rows call them. */
export const poeLimitNames: readonly (readonly [RegExp, number])[] = [
  ...typeNamed('type_?N.*max_?A', 'mostA'),
  ...typeNamed('(?=.*pse)(?=.*min)(?=.*N)', 'sourceLeastV'),
  ...typeNamed('(?=.*pd)(?=.*min)(?=.*N)', 'deviceLeastV'),
  [/channel_?R.*cat_?3/i, poeTypeLimits[1].channelOhm],
  [/channel_?R/i, poeTypeLimits[2].channelOhm],
  [/pse.*max.*V/i, poeTypeLimits[4].sourceMostV],
]

export const poeFacts: FactAnswers = [
  [
    /PSE.*power/,
    (i) => {
      const name = classOf(i)
      return name === undefined ? undefined : poeClassPower[name].sourceW
    },
  ],
  [
    /PD.*power/,
    (i) => {
      const name = classOf(i)
      return name === undefined ? undefined : poeClassPower[name].deviceW
    },
  ],
]
