import { conductorAnswers, conductorFacts } from './conductor.ts'
import type { Answers, FactAnswers } from './readInputs.ts'
import { speakerAnswers } from './speaker.ts'

/** Every calculation of the electrical half, by the name that check rows use. */
export const electricalAnswers: Answers = { ...conductorAnswers, ...speakerAnswers }

/** Every table of the electrical half, by what its rows call it. */
export const electricalFacts: FactAnswers = [...conductorFacts]
