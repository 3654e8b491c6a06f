import { administrationAnswers } from './administration.ts'
import { barcodeAnswers } from './barcode.ts'
import { framingAnswers } from './framing.ts'
import { jacketAnswers } from './jacket.ts'
import { layoutAnswers } from './layout.ts'
import { lengthAnswers } from './length.ts'
import { pathwayAnswers } from './pathway.ts'
import type { Answers } from './readInputs.ts'
import { separationAnswers } from './separation.ts'
import { spoolAnswers } from './spool.ts'
import { supportAnswers } from './support.ts'

/** Every calculation of the cabling half, by the name that check rows use. */
export const cablingAnswers: Answers = {
  ...lengthAnswers,
  ...pathwayAnswers,
  ...framingAnswers,
  ...jacketAnswers,
  ...separationAnswers,
  ...supportAnswers,
  ...administrationAnswers,
  ...barcodeAnswers,
  ...layoutAnswers,
  ...spoolAnswers,
}
