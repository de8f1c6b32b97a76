/** The one public door of the numerics: routes, screens and the command line import from here only. */
export { ENGINE_VERSION, readTraces } from './read-traces'
export type * from './types'
