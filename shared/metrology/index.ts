/** The one public door of the numerics: routes, screens and the command line import from here only. */

export { bandHeightUm } from './band-height'
export { type Decision, type DecisionInput, decide, riskOfAcceptance } from './decision'
export { engineSetUp } from './engine-set-up'
export { figureForStorage, storedFinding } from './figure-record'
export { ENGINE_VERSION, readTraces } from './read-traces'
export { fromMeasureFile, type MarkedPhoto, toReadingInput } from './reading-input'
export type * from './types'
