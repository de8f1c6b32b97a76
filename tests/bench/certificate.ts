import { certificateFixture } from '../../server/pdf/certificate.fixture'
import { printCertificate } from '../../server/use-cases/certificates/print-certificate'
import { type Measurement, measurement } from './measurement'
import { percentile, timesOf } from './timing'

const photograph = 'tests/fixtures/practice/few-bands-1.jpg'

/** A certificate's PDF from its snapshot: photograph, height map, layout and fonts. */
export async function benchCertificate(): Promise<Measurement> {
  const snapshot = certificateFixture('few-bands-1')
  const storage = { pathOf: () => photograph }
  const print = () => printCertificate({ storage }, snapshot)
  const times = await timesOf(print, { rounds: 15, warmUp: 3 })
  return measurement("a certificate's PDF", percentile(times, 0.5), 400)
}
