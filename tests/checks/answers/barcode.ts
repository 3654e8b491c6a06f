import { code128Check } from '../../../shared/calc/barcode/code128Check.ts'
import { code128Pattern } from '../../../shared/calc/barcode/code128Pattern.ts'
import { barHeightMm, code128Modules, code128WidthMm } from '../../../shared/calc/barcode/code128Size.ts'
import { qrLevels, qrModes } from '../../../shared/calc/barcode/qr.table.ts'
import { qrCapacity, qrVersionFor } from '../../../shared/calc/barcode/qrCapacity.ts'
import { qrSide, qrSideMm } from '../../../shared/calc/barcode/qrSize.ts'
import { labelOrigin, sheetClosure } from '../../../shared/calc/labelStock/sheetGeometry.ts'
import type { LabelSheet } from '../../../shared/calc/labelStock/sheet.table.ts'
import { capitalHeightMm, characterHeightMm } from '../../../shared/calc/labelStock/textHeight.ts'
import {
  circumferenceMm,
  wrapLargestDiameterMm,
  wrapLeastLengthMm,
  wrapUsualLengthMm,
} from '../../../shared/calc/labelStock/wrapLabel.ts'
import { type Answers, type Inputs, num, nums, oneOf, text } from './readInputs.ts'

const level = (i: Inputs) => oneOf(text(i, 'level'), qrLevels)
const sheet = (i: Inputs): LabelSheet => ({
  widthMm: num(i, 'sheet_w'),
  heightMm: num(i, 'sheet_h'),
  columns: num(i, 'cols'),
  rows: num(i, 'rows'),
  labelWidthMm: num(i, 'w'),
  labelHeightMm: num(i, 'h'),
  leftMm: num(i, 'left'),
  topMm: num(i, 'top'),
  gapXMm: num(i, 'gapx'),
  gapYMm: num(i, 'gapy'),
})

export const barcodeAnswers: Answers = {
  code128_check: (i) => code128Check(num(i, 'start'), nums(i, 'values')),
  code128_modules: (i) => code128Modules(num(i, 'n')),
  code128_width: (i) => code128WidthMm(num(i, 'n'), num(i, 'X')),
  bar_height: (i) => barHeightMm(num(i, 'width')),
  code128_pattern: (i) => code128Pattern(num(i, 'value')),
  qr_cap: (i) => {
    const [correction, mode] = [level(i), oneOf(text(i, 'mode'), qrModes)]
    return correction && mode && qrCapacity(num(i, 'version'), correction, mode)
  },
  qr_size: (i) => {
    const side = qrSide(num(i, 'version'))
    return side && [side.modules, side.withQuietZone]
  },
  qr_mm: (i) => qrSideMm(num(i, 'version'), num(i, 'module')),
  qr_version: (i) => {
    const correction = level(i)
    return correction && qrVersionFor(num(i, 'n'), correction, oneOf(text(i, 'mode'), qrModes) ?? 'byte')
  },
  sheet_closure: (i) => {
    const closure = sheetClosure(sheet(i))
    return closure && [closure.widthMm, closure.heightMm]
  },
  label_origin: (i) => {
    const origin = labelOrigin(sheet(i), num(i, 'row'), num(i, 'col'))
    return origin && [origin.xMm, origin.yMm]
  },
  circumference: (i) => circumferenceMm(num(i, 'd')),
  selflam_min: (i) => wrapLeastLengthMm(num(i, 'd'), num(i, 'print'), num(i, 'overlap')),
  selflam_rule: (i) => {
    const usual = wrapUsualLengthMm(num(i, 'd'))
    return usual && [usual.fromMm, usual.toMm]
  },
  selflam_maxod: (i) => wrapLargestDiameterMm(num(i, 'total'), num(i, 'print')),
  char_height: (i) => characterHeightMm(num(i, 'D'), num(i, 'arcmin')),
  pt_mm: (i) => capitalHeightMm(num(i, 'pt')),
}
