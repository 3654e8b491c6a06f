import type { CheckRow } from '../checkRow.ts'
import { cablingAnswers } from './cabling.ts'
import type { Answer, Answers } from './readInputs.ts'

/** Calculations by the name that rows use. */
const calculations: Answers = { ...cablingAnswers }

/** Table entries by the formula that names their table. */
const facts: Answers = {}

/** The product's own code for a row; undefined where nothing answers it. */
export const answerOf = ({ fn, formula }: Pick<CheckRow, 'fn' | 'formula'>): Answer | undefined =>
  fn === 'fact' ? facts[formula] : calculations[fn]
