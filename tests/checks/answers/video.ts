import { reducedClassReachM, straightRunM } from '../../../shared/calc/video/linkReach.ts'
import { usbLengthM } from '../../../shared/calc/video/usb.table.ts'
import { delayLengthM } from '../../../shared/calc/video/usbLength.ts'
import { advisedCategories, videoCableGbps } from '../../../shared/calc/video/videoCable.table.ts'
import { cableCategoryFor } from '../../../shared/calc/video/videoCable.ts'
import {
  characterRateMhz,
  chromas,
  fixedRateGbps,
  linkGbps,
  linkPayloadGbps,
  pixelClockMhz,
  tmdsGbps,
} from '../../../shared/calc/video/videoRate.ts'
import { type Answers, byWords, type FactAnswers, type Inputs, num, oneOf, text } from './readInputs.ts'

type RateOf = typeof tmdsGbps
const rateBy = (rate: RateOf) => (i: Inputs) => {
  const chroma = oneOf(text(i, 'chroma'), chromas)
  return chroma && rate(num(i, 'pixel_clock_mhz'), chroma, num(i, 'bpc'))
}

/** Rows name one category, or two that have the same limit; the first speaks for both. */
const linkCategory = (i: Inputs) =>
  oneOf(text(i, 'category').split('/')[0] ?? '', ['5e', '6', '6A', '7', '7A', '8'] as const)

const usbLinks: readonly (readonly [RegExp, keyof typeof usbLengthM])[] = [
  [/low/i, '1.x low speed'],
  [/USB ?4/i, 'USB4'],
  [/2x2/i, '3.2 Gen 2x2'],
  [/Gen ?2/i, '3.2 Gen 2'],
  [/Gen ?1.*(practical|max)/i, '3.2 Gen 1'],
  [/Gen ?1/i, '3.2 Gen 1 certain'],
  [/USB 2/i, '2.0'],
]

export const videoAnswers: Answers = {
  pixel_clock_mhz: (i) => pixelClockMhz(num(i, 'h_total'), num(i, 'v_total'), num(i, 'fps')),
  tmds_char_mhz: rateBy(characterRateMhz),
  tmds_gbps: rateBy(tmdsGbps),
  frl_gbps: rateBy(fixedRateGbps),
  frl_link_gbps: (i) => linkGbps(num(i, 'lanes'), num(i, 'gbps_per_lane')),
  frl_payload_gbps: (i) => linkPayloadGbps(num(i, 'lanes'), num(i, 'gbps_per_lane')),
  // Where no category covers the rate, rows write none.
  hdmi_category: (i) => cableCategoryFor(num(i, 'gbps')) ?? 'none',
  hdbt_max_m: (i) => {
    const category = linkCategory(i)
    return category && straightRunM(num(i, 'char_mhz'), category)
  },
  usb_len_m: (i) => delayLengthM(num(i, 'delay_ns'), num(i, 'ns_per_m')),
}

export const videoFacts: FactAnswers = [
  [
    /category maximum/,
    (i) => {
      const name = oneOf(text(i, 'category'), [...advisedCategories, 'Ultra96'])
      return name && videoCableGbps[name]
    },
  ],
  [
    /full-distance class/,
    (i) => {
      const category = linkCategory(i)
      // Rows say which side of 225 MHz; any rate on that side answers.
      const clockMhz = /^(>|over|above)/.test(text(i, 'video')) ? 297 : 148.5
      return category && straightRunM(clockMhz, category)
    },
  ],
  [/reduced-distance class/, (i) => reducedClassReachM[/1080/.test(text(i, 'key')) ? '1080p' : '4K']],
  [
    /passive cable length/,
    (i) => {
      const link = byWords(text(i, 'link'), usbLinks)
      return link && usbLengthM[link]
    },
  ],
]
