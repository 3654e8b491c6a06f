import { bs2051Count, isBs2051Position } from '../../../shared/calc/layout/bs2051.ts'
import { bs2051Channels, type Bs2051Layout, bs2051Systems } from '../../../shared/calc/layout/bs2051.table.ts'
import {
  type Bs775Channel,
  bs775Positions,
  isBs775Azimuth,
  pictureAngleDeg,
} from '../../../shared/calc/layout/bs775.ts'
import { amplifierChannels, channelCount } from '../../../shared/calc/layout/channelCount.ts'
import { polarPosition } from '../../../shared/calc/layout/polarPosition.ts'
import { sharedFormat } from '../../../shared/calc/layout/sharedFormat.ts'
import { speakerElevationDeg, speakerHeightM } from '../../../shared/calc/layout/speakerHeight.ts'
import { isTopWithin, pictureWidth, viewingDistance } from '../../../shared/calc/layout/viewingDistance.ts'
import { type Answers, type Inputs, num, oneOf, text, texts } from './readInputs.ts'

const layouts = Object.keys(bs2051Channels) as Bs2051Layout[]
const systems = Object.keys(bs2051Systems) as (keyof typeof bs2051Systems)[]
const layoutOf = (i: Inputs) => {
  const system = oneOf(text(i, 'system'), systems)
  return oneOf(text(i, 'layout'), layouts) ?? (system && bs2051Systems[system])
}

export const layoutAnswers: Answers = {
  polar_xy: (i) => {
    const place = polarPosition(num(i, 'r'), num(i, 'az'))
    return place && [place.x, place.y]
  },
  bs775_ok: (i) => {
    const channel = oneOf(text(i, 'name'), Object.keys(bs775Positions) as Bs775Channel[])
    return channel && isBs775Azimuth(channel, num(i, 'az'))
  },
  view_angle_h: (i) => pictureAngleDeg(num(i, 'k')),
  bs2051_count: (i) => {
    const layout = layoutOf(i)
    const count = layout && bs2051Count(layout)
    return count && [count.loudspeakers, count.lfe]
  },
  bs2051_ok: (i) => {
    const layout = layoutOf(i)
    return (
      layout && isBs2051Position(layout, text(i, 'channel'), { azimuthDeg: num(i, 'az'), elevationDeg: num(i, 'el') })
    )
  },
  fmt_count: (i) => {
    const count = channelCount(text(i, 'format'))
    return count && [count.amplifierChannels, count.subwoofers, count.outputs]
  },
  view_dist: (i) => viewingDistance(num(i, 'diag'), num(i, 'angle')),
  view_dist_factor: (i) => viewingDistance(1, num(i, 'angle')),
  width: (i) => pictureWidth(num(i, 'diag')),
  height_speaker: (i) => speakerHeightM(num(i, 'd'), num(i, 'el')),
  el_angle: (i) => speakerElevationDeg(num(i, 'z'), num(i, 'd')),
  vert_ok: (i) => isTopWithin(num(i, 'eye'), num(i, 'top'), num(i, 'd')),
  zones_amp: (i) => amplifierChannels(texts(i, 'theatre'), num(i, 'stereo_zones')),
  share_fmt: (i) => sharedFormat(texts(i, 'sinks'), texts(i, 'order')),
}
