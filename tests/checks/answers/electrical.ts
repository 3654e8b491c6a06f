import { analogueAnswers, analogueLimitNames } from './analogue.ts'
import { coaxAnswers, coaxFacts } from './coax.ts'
import { conductorAnswers, conductorFacts } from './conductor.ts'
import { fibreAnswers, fibreFacts } from './fibre.ts'
import { poeAnswers, poeFacts, poeLimitNames } from './poe.ts'
import { powerAnswers, powerFacts } from './power.ts'
import { type Answers, byWords, type FactAnswers, type Inputs, text } from './readInputs.ts'
import { speakerAnswers } from './speaker.ts'
import { twistedPairAnswers, twistedPairFacts, twistedPairLimitNames } from './twistedPair.ts'
import { videoAnswers, videoFacts } from './video.ts'

/** Every calculation of the electrical half, by the name that check rows use. */
export const electricalAnswers: Answers = {
  ...conductorAnswers,
  ...speakerAnswers,
  ...twistedPairAnswers,
  ...videoAnswers,
  ...poeAnswers,
  ...powerAnswers,
  ...coaxAnswers,
  ...fibreAnswers,
  ...analogueAnswers,
}

/** Limits that rows ask for by name alone. */
const limitNames = [...twistedPairLimitNames, ...poeLimitNames, ...analogueLimitNames]
const limitByName = (i: Inputs) => byWords(text(i, 'name'), limitNames)

/** Every table of the electrical half, by what its rows call it. */
export const electricalFacts: FactAnswers = [
  ...conductorFacts,
  ...twistedPairFacts,
  ...videoFacts,
  ...poeFacts,
  ...powerFacts,
  ...coaxFacts,
  ...fibreFacts,
  [/^limit$/, limitByName],
]
