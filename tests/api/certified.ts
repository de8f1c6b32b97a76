import type { Certificate } from '@shared/schemas/certificates'
import type { Reading } from '@shared/schemas/readings'
import sharp from 'sharp'
import { type Bench, bowedMarks, mark, startAtBench, takeReading } from './readings-support'
import { type SignedIn, testPassword } from './support'

export interface CertificateBench extends Bench {
  reviewer: SignedIn
  qa: SignedIn
}

/** An inspector, a reviewer and a QA person. */
export async function startWithQa(): Promise<CertificateBench> {
  const bench = await startAtBench()
  return { ...bench, reviewer: await bench.signInAs('reviewer'), qa: await bench.signInAs('qa') }
}

/** A photographed, traced, computed and sent reading. */
export async function sendMeasured(
  bench: Bench,
  bowBands = 1,
  by: SignedIn = bench.inspector,
  more = {},
): Promise<Reading> {
  const reading = await takeReading(bench, by, more)
  const path = `/api/readings/${reading.id}`
  await by.agent
    .post(`${path}/photos`)
    .field('role', 'bands')
    .attach('photo', await grey(), 'bands.png')
    .expect(201)
  await mark(bench, reading, bowedMarks(bowBands), 0, by)
  await by.agent.post(`${path}/compute`).expect(200)
  return (await by.agent.post(`${path}/send`).expect(200)).body
}

/** A reading that was agreed to. */
export async function agreeMeasured(bench: CertificateBench, bowBands = 1, more = {}): Promise<Reading> {
  const { id } = await sendMeasured(bench, bowBands, bench.inspector, more)
  return (await bench.reviewer.agent.post(`/api/readings/${id}/agree`).expect(200)).body
}

export async function issue(by: SignedIn, readingId: string, more = {}): Promise<Certificate> {
  const answer = await by.agent
    .post(`/api/readings/${readingId}/certificate`)
    .send({ password: testPassword, ...more })
    .expect(201)
  return answer.body
}

/** The square that the marks of `bowedMarks` stand on. */
function grey(): Promise<Buffer> {
  return sharp({ create: { width: 1000, height: 1000, channels: 3, background: '#77706a' } })
    .png()
    .toBuffer()
}
