import { readingListQuerySchema } from '@shared/schemas/readings'
import { closeDatabase } from '../../server/db/client'
import { listReadings } from '../../server/use-cases/readings/list-readings'
import { type LargeShop, makeLargeShop, readingCount } from './large-shop'
import { type Measurement, measurement } from './measurement'
import { percentile, timesOf } from './timing'

const queries = [
  {},
  { state: 'sentForReview' },
  { state: 'draft,sentBack' },
  { mine: 'true' },
  { mine: 'true', state: 'draft' },
  { search: 'pn-1017' },
  { search: 'ring kind 31' },
  { search: 'customer' },
  { search: 'nothing of that name' },
  { limit: '200' },
]

/** What the archive is asked: every kind of condition, alone and together. */
const searches = [
  { search: 'pn-1017', state: 'certified' },
  { search: 'ring 31', verdict: 'conforms' },
  { verdict: 'doesNotConform' },
  { verdict: 'neitherProven', from: '2025-03-01' },
  { from: '2025-03-01', to: '2025-03-31' },
  { from: '2025-03-01', verdict: 'conforms', state: 'agreed' },
  { search: 'customer', to: '2025-06-30' },
  { search: 'nothing of that name' },
]

/** Pages of the list of readings as the server makes them, JSON included, out of 20,000. */
export async function benchReadingList(folder: string): Promise<Measurement[]> {
  const shop = await makeLargeShop(folder)
  const marks = pageMarks(shop)
  const ask = (asked: readonly object[]) => (round: number) => {
    const query = { ...asked[round % asked.length], ...marks[round % marks.length] }
    JSON.stringify(listPage(shop, query, round))
  }
  const lists = await timesOf(ask(queries), { rounds: 300, warmUp: 30 })
  const found = await timesOf(ask(searches), { rounds: 300, warmUp: 30 })
  await shop.context.analysis.close()
  closeDatabase(shop.context.db)
  return [
    measurement(`list of readings out of ${readingCount}, p95`, percentile(lists, 0.95), 25),
    measurement(`search of the archive out of ${readingCount}, p95`, percentile(found, 0.95), 25),
  ]
}

function listPage({ context, people }: LargeShop, query: object, round: number) {
  return listReadings(context, people[round % people.length], readingListQuerySchema.parse(query))
}

/** The first page, the second, and ones far down. */
function pageMarks(shop: LargeShop): object[] {
  const marks: object[] = [{}]
  let before: string | null | undefined
  for (let page = 0; page < 60; page++) {
    before = listPage(shop, { limit: '200', before: before ?? undefined }, 0).next
    if (before && [0, 20, 59].includes(page)) marks.push({ before })
  }
  return marks
}
