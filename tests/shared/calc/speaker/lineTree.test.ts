import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { speakerLadder } from '../../../../shared/calc/speaker/ladder.ts'
import { lineNode, ownShare, totalRatio, type LineLeg } from '../../../../shared/calc/speaker/lineTree.ts'

const ohm = fc.double({ min: 0.01, max: 50, noNaN: true })
const load = fc.double({ min: 2, max: 5000, noNaN: true })

describe('a line that parts', () => {
  it('two 8 ohm speakers behind a control, the further one on 0.5 ohm: levels as nodes give them', () => {
    // Behind the control 8 ohm and 8.5 ohm in parallel: 4.1212 ohm. With 0.4 ohm before it the level there is
    // 4.1212/4.5212 = 0.91153, and at the far speaker 8/8.5 of that: 0.85791, which is 1.331 dB down.
    const node = lineNode({ loadsOhm: [8], onward: [{ loopOhm: 0.5, loadsOhm: [8], onward: [] }] })!
    expect(node.behindOhm).toBeCloseTo(4.1212, 4)
    const ratio = totalRatio(0.4, node)!
    expect(1 / (1 + ratio)).toBeCloseTo(0.85791, 5)
    expect(20 * Math.log10(1 + ratio)).toBeCloseTo(1.331, 3)
  })
  it('is the ladder where it does not part', () => {
    fc.assert(
      fc.property(fc.array(fc.record({ loopOhm: ohm, loadOhm: load }), { minLength: 1, maxLength: 8 }), (sections) => {
        const ladder = speakerLadder(sections)!
        const tree = sections.reduceRight<LineLeg | null>((onward, { loopOhm, loadOhm }) => ({ loopOhm, loadsOhm: [loadOhm], onward: onward ? [onward] : [] }), null)!
        const node = lineNode(tree)!
        expect(20 * Math.log10(1 + totalRatio(tree.loopOhm, node)!)).toBeCloseTo(Math.max(...ladder.lossDb), 9)
        expect(tree.loopOhm + node.behindOhm).toBeCloseTo(ladder.inputOhm, 6)
      }),
    )
  })
  it('leaves of a limit what the legs after it do not take, exactly', () => {
    fc.assert(
      fc.property(ohm, load, load, fc.double({ min: 0.01, max: 1, noNaN: true }), (loop, first, second, limit) => {
        const node = lineNode({ loadsOhm: [first], onward: [{ loopOhm: loop, loadsOhm: [second], onward: [] }] })!
        const share = ownShare(limit, node.worstFactor)!
        fc.pre(share > 0)
        expect(totalRatio(share * node.behindOhm, node)).toBeCloseTo(limit, 9)
      }),
    )
  })
  it('gives no answer for no load, a load of nothing, or a resistance below nothing', () => {
    expect(lineNode({ loadsOhm: [], onward: [] })).toBeNull()
    expect(lineNode({ loadsOhm: [0], onward: [] })).toBeNull()
    expect(lineNode({ loadsOhm: [8], onward: [{ loopOhm: -1, loadsOhm: [8], onward: [] }] })).toBeNull()
    expect(lineNode({ loadsOhm: [8], onward: [{ loopOhm: 1, loadsOhm: [], onward: [] }] })).toBeNull()
    expect(lineNode({ loadsOhm: [Number.NaN], onward: [] })).toBeNull()
    expect(totalRatio(-1, { behindOhm: 8, worstFactor: 1 })).toBeNull()
    expect(ownShare(0.1, Number.NaN)).toBeNull()
  })
})
