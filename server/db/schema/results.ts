import type { TracedReading } from '@shared/metrology/types'
import type { Face } from '@shared/schemas/parts'
import type { Conditions, ReadingSetUp } from '@shared/schemas/readings'
import type { Figure, ReadingResult, Verdict } from '@shared/schemas/results'
import { type AnySQLiteColumn, index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { people } from './people'
import { readings } from './readings'

/** Everything else the figure came from, as it was then: set-up and equipment may be changed later. */
export interface ResultInputs {
  setUp: ReadingSetUp
  conditions: Conditions
  traced: TracedReading
}

/** Never changed once written (a trigger says so): computing again adds a row. */
export const results = sqliteTable(
  'results',
  {
    id: text('id').primaryKey(),
    readingId: text('reading_id')
      .notNull()
      .references((): AnySQLiteColumn => readings.id),
    marksVersion: integer('marks_version').notNull(),
    engineVersion: text('engine_version').notNull(),
    mode: text('mode').$type<'traced' | 'automatic'>().notNull(),
    outcome: text('outcome').$type<'figure' | 'refused'>().notNull(),
    flatnessUm: real('flatness_um'),
    minimumZoneUm: real('minimum_zone_um'),
    leastSquaresUm: real('least_squares_um'),
    expandedUncertaintyUm: real('expanded_uncertainty_um'),
    sagittaUm: real('sagitta_um'),
    bandUm: real('band_um'),
    form: text('form'),
    verdict: text('verdict').$type<Verdict>().notNull(),
    supportedShare: real('supported_share'),
    computedAt: text('computed_at').notNull(),
    /** null when the shop's own run computed it again. */
    computedById: text('computed_by_id').references(() => people.id),
    /** The face with its tolerance and rule as the figure was judged by. */
    face: text('face', { mode: 'json' }).$type<Face>().notNull(),
    findings: text('findings', { mode: 'json' }).$type<ReadingResult['findings']>().notNull(),
    inputs: text('inputs', { mode: 'json' }).$type<ResultInputs>().notNull(),
    figure: text('figure', { mode: 'json' }).$type<Figure>(),
  },
  (table) => [
    index('results_reading').on(table.readingId, table.computedAt),
    index('results_verdict').on(table.verdict, table.computedAt),
  ],
)
