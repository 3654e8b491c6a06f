import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { qrDataCodewords, qrLevels, qrModes } from '../../../../shared/calc/barcode/qr.table.ts'
import { qrCapacity, qrModeOf, qrVersionFor } from '../../../../shared/calc/barcode/qrCapacity.ts'
import { qrModuleFitMm, qrSide, qrSideMm } from '../../../../shared/calc/barcode/qrSize.ts'

describe('QR capacity (ISO/IEC 18004)', () => {
  it.each([
    [1, [17, 14, 11, 7]], [2, [32, 26, 20, 14]], [3, [53, 42, 32, 24]], [4, [78, 62, 46, 34]], [5, [106, 84, 60, 44]],
    [6, [134, 106, 74, 58]], [10, [271, 213, 151, 119]], [40, [2953, 2331, 1663, 1273]],
  ])('version %i holds so many bytes at L, M, Q, H', (version, bytes) => {
    expect(qrLevels.map((level) => qrCapacity(version, level, 'byte'))).toEqual(bytes)
  })

  it('is 7089 digits, 4296 letters, 2953 bytes, 1817 kanji at 40-L', () => {
    expect(qrModes.map((mode) => qrCapacity(40, 'L', mode))).toEqual([7089, 4296, 2953, 1817])
  })

  it('has 40 versions that grow, each level below the one before', () => {
    for (const level of qrLevels) {
      expect(qrDataCodewords[level]).toHaveLength(40)
      expect(qrDataCodewords[level]).toEqual(qrDataCodewords[level].toSorted((a, b) => a - b))
    }
    for (let version = 1; version <= 40; version++) {
      const row = qrLevels.map((level) => qrCapacity(version, level, 'byte')!)
      expect(row).toEqual(row.toSorted((a, b) => b - a))
    }
  })

  it('gives the smallest version that holds a text', () => {
    expect(qrVersionFor(40, 'M')).toBe(3)
    expect(qrVersionFor(2954, 'L')).toBeNull()
    expect(qrVersionFor(-1, 'L')).toBeNull()
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 1273 }),
        fc.constantFrom(...qrLevels),
        fc.constantFrom(...qrModes),
        (count, level, mode) => {
          const version = qrVersionFor(count, level, mode)
          if (version === null) return qrCapacity(40, level, mode)! < count
          return (
            qrCapacity(version, level, mode)! >= count &&
            (version === 1 || qrCapacity(version - 1, level, mode)! < count)
          )
        },
      ),
    )
  })

  it('knows the cheapest mode of a text', () => {
    expect(qrModeOf('0123')).toBe('numeric')
    expect(qrModeOf('PAT1-S1')).toBe('alphanumeric')
    expect(qrModeOf('Pat1')).toBe('byte')
    expect(qrModeOf('')).toBe('byte')
  })
})

describe('QR size', () => {
  it('is 4 v + 17 modules and four quiet ones on each side', () => {
    expect(qrSide(1)).toEqual({ modules: 21, withQuietZone: 29 })
    expect(qrSide(40)).toEqual({ modules: 177, withQuietZone: 185 })
    expect([0, 41, 1.5].map(qrSide)).toEqual([null, null, null])
    expect(qrSideMm(2, 0.33)).toBeCloseTo(10.89, 9)
    expect(qrSideMm(2, -1)).toBeNull()
  })

  it('fits whole printer dots', () => {
    expect(qrModuleFitMm(2, 12, 300)).toBeCloseTo(0.3387, 4)
    expect(qrModuleFitMm(40, 5, 300)).toBeNull()
  })
})
