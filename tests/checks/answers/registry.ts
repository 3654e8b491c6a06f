import type { CheckRow } from '../checkRow.ts'
import { cablingAnswers } from './cabling.ts'
import { electricalAnswers, electricalFacts } from './electrical.ts'
import { type Answer, type Answers, byWords, type FactAnswers } from './readInputs.ts'

/** Calculations by the name that rows use. */
const calculations: Answers = { ...cablingAnswers, ...electricalAnswers }

/** Table entries by the formula that names their table. */
const facts: FactAnswers = electricalFacts

/** The product's own code for a row; undefined where nothing answers it. */
export const answerOf = ({ fn, formula }: Pick<CheckRow, 'fn' | 'formula'>): Answer | undefined =>
  fn === 'fact' ? byWords(formula, facts) : calculations[fn]
