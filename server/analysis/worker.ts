/** What a thread of the pool runs. */
export { computeOutcome as default } from './compute-outcome'
