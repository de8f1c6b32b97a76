import { createHash } from 'node:crypto'
import { once } from 'node:events'
import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { request } from 'node:http'
import type { AddressInfo } from 'node:net'
import { join } from 'node:path'
import { crc32 } from 'node:zlib'
import sharp, { type Sharp } from 'sharp'
import { describe, expect, it, vi } from 'vitest'
import { mostBytes } from '../../server/storage/photo-limits'
import { type Bench, startAtBench, takeReading } from './readings-support'
import { type SignedIn, testPassword } from './support'

/** A small picture that is 90 px wide and 60 high, lighter to the right. */
function picture(shift = 0): Sharp {
  const [width, height] = [90, 60]
  const data = Buffer.alloc(width * height * 3)
  for (let i = 0; i < width * height; i++) data.fill(((i % width) * 2 + shift) % 256, i * 3, i * 3 + 3)
  return sharp(data, { raw: { width, height, channels: 3 } })
}

const jpeg = (shift = 0) => picture(shift).jpeg().toBuffer()

function upload(by: SignedIn, readingId: string, content: Buffer, fileName = 'bands.jpg', role = 'bands') {
  return by.agent
    .post(`/api/readings/${readingId}/photos`)
    .field('role', role)
    .attach('photo', content, fileName)
}

async function startWithReading() {
  const bench = await startAtBench()
  const reading = await takeReading(bench)
  return { ...bench, reading, send: upload.bind(null, bench.inspector, reading.id) }
}

const incoming = ({ context }: Bench) => readdirSync(join(context.env.dataDir, 'photos', 'incoming'))

describe('a photograph that is uploaded', () => {
  it('is kept under the SHA-256 of its content, byte for byte', async () => {
    const bench = await startWithReading()
    const content = await jpeg()
    const { body } = await bench.send(content, 'DSC 0042.JPG').expect(201)
    const sha256 = createHash('sha256').update(content).digest('hex')
    expect(body).toMatchObject({
      sha256,
      role: 'bands',
      fileName: 'DSC 0042.JPG',
      widthPx: 90,
      heightPx: 60,
      bitDepth: 8,
      format: 'jpeg',
      bytes: content.length,
    })
    const stored = bench.context.storage.pathOf(sha256)
    expect(stored).toContain(join(sha256.slice(0, 2), sha256.slice(2, 4)))
    expect(readFileSync(stored).equals(content)).toBe(true)
    expect(incoming(bench)).toEqual([])
    const shown = await bench.inspector.agent.get(`/api/readings/${bench.reading.id}`).expect(200)
    expect(shown.body.photos).toEqual([body])
    expect(shown.body.photoSha256).toBe(sha256)
  })

  it.each([
    ['png', 8, () => picture().png()],
    ['png', 16, () => picture().toColourspace('rgb16').png()],
    ['webp', 8, () => picture().webp()],
    ['tiff', 8, () => picture().tiff()],
    ['avif', 8, () => picture().avif()],
    ['jpeg', 8, () => picture().greyscale().jpeg()],
  ] as const)(
    'may be %s of %i bit, judged by its content and not its name',
    async (format, bitDepth, make) => {
      const bench = await startWithReading()
      const { body } = await bench.send(await make().toBuffer(), 'no-name.bin').expect(201)
      expect(body).toMatchObject({ format, bitDepth, widthPx: 90, heightPx: 60 })
      await bench.inspector.agent.get(`/api/photos/${body.sha256}/preview?width=160`).expect(200)
    },
  )

  it('is as wide as it is high when EXIF says that the camera was turned', async () => {
    const bench = await startWithReading()
    const turned = await picture().withMetadata({ orientation: 6 }).jpeg().toBuffer()
    const { body } = await bench.send(turned).expect(201)
    expect([body.widthPx, body.heightPx]).toEqual([60, 90])
    const preview = await bench.inspector.agent.get(`/api/photos/${body.sha256}/preview?width=full`)
    const shown = await sharp(preview.body).metadata()
    expect([shown.width, shown.height, shown.orientation]).toEqual([60, 90, undefined])
  })

  it('keeps its name’s letters, whatever alphabet they are of', async () => {
    const bench = await startWithReading()
    const { body } = await bench.send(await jpeg(), 'Fläche 2 – πλάκα.jpg').expect(201)
    expect(body.fileName).toBe('Fläche 2 – πλάκα.jpg')
  })

  it('is on a reading once only, while another reading may have it too', async () => {
    const bench = await startWithReading()
    const other = await takeReading(bench)
    const content = await jpeg()
    await bench.send(content).expect(201)
    const again = await bench.send(content)
    expect([again.status, again.body.error.code]).toEqual([409, 'alreadyThere'])
    await upload(bench.inspector, other.id, content).expect(201)
    expect(incoming(bench)).toEqual([])
  })

  it('is refused on somebody else’s reading', async () => {
    const bench = await startWithReading()
    const other = await bench.signInAs('inspector')
    const answer = await upload(other, bench.reading.id, await jpeg())
    expect([answer.status, answer.body.error.code]).toEqual([403, 'notYours'])
  })
})

describe('an upload that breaks off', () => {
  it('leaves nothing behind', async () => {
    const bench = await startWithReading()
    const server = bench.app.express.listen(0)
    await once(server, 'listening')
    const { port } = server.address() as AddressInfo
    const session = (await bench.agent().post('/api/session').send(signInOf(bench))).headers['set-cookie'][0]
    const upload = request({
      port,
      method: 'POST',
      path: `/api/readings/${bench.reading.id}/photos`,
      headers: {
        cookie: session.split(';')[0],
        'sec-fetch-site': 'same-origin',
        'content-type': 'multipart/form-data; boundary=edge',
        'content-length': '1000000',
      },
    })
    upload.on('error', () => {})
    upload.write('--edge\r\nContent-Disposition: form-data; name="photo"; filename="a.jpg"\r\n\r\n')
    upload.write((await jpeg()).subarray(0, 200))
    await vi.waitFor(() => expect(incoming(bench)).toHaveLength(1))
    upload.destroy()
    await vi.waitFor(() => expect(incoming(bench)).toEqual([]))
    server.close()
  })
})

/** The same PNG, but for what its header says of its size. */
function withSize(png: Buffer, width: number, height: number): Buffer {
  const claimed = Buffer.from(png)
  claimed.writeUInt32BE(width, 16)
  claimed.writeUInt32BE(height, 20)
  claimed.writeUInt32BE(crc32(claimed.subarray(12, 29)), 29)
  return claimed
}

describe('a file that can’t be a photograph', () => {
  const refusals: [string, () => Promise<Buffer>, number, string, RegExp][] = [
    ['is empty', async () => Buffer.alloc(0), 422, 'brokenFile', /empty/],
    ['is text', async () => Buffer.from('not a picture'), 415, 'wrongFileType', /Use JPEG/],
    ['is a picture of another kind', () => picture().gif().toBuffer(), 415, 'wrongFileType', /Use JPEG/],
    [
      'is a drawing that could carry a program',
      async () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>'),
      415,
      'wrongFileType',
      /Use JPEG/,
    ],
    [
      'has a JPEG’s head and nothing behind',
      async () => (await jpeg()).subarray(0, 40),
      422,
      'brokenFile',
      /again/,
    ],
    ['is a JPEG cut short', async () => halfOf(await jpeg()), 422, 'brokenFile', /again/],
    ['is a PNG cut short', async () => halfOf(await picture().png().toBuffer()), 422, 'brokenFile', /again/],
    [
      'is a TIFF cut short',
      async () => halfOf(await picture().tiff().toBuffer()),
      422,
      'brokenFile',
      /again/,
    ],
    [
      'has more than 100 megapixels',
      async () => withSize(await picture().png().toBuffer(), 12_000, 9_000),
      413,
      'tooManyPixels',
      /108 megapixels.*100/,
    ],
    ['is larger than 60 MB', async () => Buffer.alloc(mostBytes + 1), 413, 'tooLarge', /60 MB/],
  ]

  it.each(refusals)(
    'because it %s is refused with a sentence of its own',
    async (_why, make, status, code, says) => {
      const bench = await startWithReading()
      await bench.send(await jpeg()).expect(201)
      const answer = await bench.send(await make(), 'photo.jpg')
      expect([answer.status, answer.body.error.code]).toEqual([status, code])
      expect(answer.body.error.message).toMatch(says)

      const shown = await bench.inspector.agent.get(`/api/readings/${bench.reading.id}`).expect(200)
      expect(shown.body.photos, 'the good one stays').toHaveLength(1)
      expect(incoming(bench)).toEqual([])
    },
  )

  it('or isn’t there at all, or is of an unknown role, is the caller’s fault', async () => {
    const bench = await startWithReading()
    const path = `/api/readings/${bench.reading.id}/photos`
    const none = await bench.inspector.agent.post(path).field('role', 'bands')
    const role = await bench.send(await jpeg(), 'a.jpg', 'portrait')
    const field = await bench.inspector.agent.post(path).attach('picture', await jpeg(), 'a.jpg')
    expect([none.status, role.status, field.status]).toEqual([400, 400, 400])
    expect(none.body.error.fields.photo).toMatch(/Choose/)
    expect(incoming(bench)).toEqual([])
  })
})

const signInOf = ({ inspector }: Bench) => ({ email: inspector.me.email, password: testPassword })

const halfOf = (content: Buffer) => content.subarray(0, Math.floor(content.length / 2))

describe('a preview', () => {
  it('has the width that was asked for, but never more than the photograph', async () => {
    const bench = await startWithReading()
    const wide = await picture().resize(1500, 1000).jpeg().toBuffer()
    const { body } = await bench.send(wide).expect(201)
    const widthOf = async (width: string) => {
      const answer = await bench.inspector.agent.get(`/api/photos/${body.sha256}/preview?width=${width}`)
      expect([answer.status, answer.type]).toEqual([200, 'image/jpeg'])
      expect(answer.headers['cache-control']).toBe('private, max-age=31536000, immutable')
      return (await sharp(answer.body).metadata()).width
    }
    expect(await widthOf('160')).toBe(160)
    expect(await widthOf('640')).toBe(640)
    expect(await widthOf('2048')).toBe(1500)
    expect(await widthOf('full')).toBe(1500)
  })

  it('passes on nothing of where and with what the photograph was taken', async () => {
    const bench = await startWithReading()
    const content = await picture()
      .withExif({
        IFD0: { Make: 'Tellworth', Copyright: 'nobody' },
        IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' },
      })
      .jpeg()
      .toBuffer()
    const { body } = await bench.send(content).expect(201)
    for (const width of ['160', 'full']) {
      const answer = await bench.inspector.agent.get(`/api/photos/${body.sha256}/preview?width=${width}`)
      const { exif, icc, xmp } = await sharp(answer.body).metadata()
      expect([exif, icc, xmp]).toEqual([undefined, undefined, undefined])
    }
  })

  it('is made once, however many ask at the same moment', async () => {
    const bench = await startWithReading()
    const { body } = await bench.send(await jpeg()).expect(201)
    const { storage } = bench.context
    const files = await Promise.all([1, 2, 3].map(() => storage.preview(body.sha256, 640)))
    expect(new Set(files).size).toBe(1)
    expect(readdirSync(join(files[0], '..'))).toEqual([`${body.sha256}-640.jpg`])
  })

  it('is refused for a photograph that there isn’t, and for another width', async () => {
    const bench = await startWithReading()
    const { body } = await bench.send(await jpeg()).expect(201)
    const { agent } = bench.inspector
    const unknown = await agent.get(`/api/photos/${'0'.repeat(64)}/preview?width=160`)
    const climbing = await agent.get('/api/photos/..%2f..%2flapwing.sqlite/preview?width=160')
    const width = await agent.get(`/api/photos/${body.sha256}/preview?width=161`)
    expect([unknown.status, climbing.status, width.status]).toEqual([404, 404, 400])
  })
})

describe('a photograph that is taken off a reading', () => {
  it('goes with its previews, unless another reading has it', async () => {
    const bench = await startWithReading()
    const other = await takeReading(bench)
    const content = await jpeg()
    const { body } = await bench.send(content).expect(201)
    const second = await upload(bench.inspector, other.id, content).expect(201)
    const { agent } = bench.inspector
    const stored = bench.context.storage.pathOf(body.sha256)
    const preview = await bench.context.storage.preview(body.sha256, 160)

    await agent.delete(`/api/readings/${bench.reading.id}/photos/${body.id}`).expect(204)
    expect(existsSync(stored)).toBe(true)
    await agent.delete(`/api/readings/${other.id}/photos/${second.body.id}`).expect(204)
    expect([existsSync(stored), existsSync(preview)]).toEqual([false, false])
    await agent.get(`/api/photos/${body.sha256}/preview?width=160`).expect(404)
    await bench.send(content).expect(201)
  })

  it('is only taken off the reading that has it, by the one who took that', async () => {
    const bench = await startWithReading()
    const { body } = await bench.send(await jpeg()).expect(201)
    const other = await takeReading(bench)
    const stranger = await bench.signInAs('inspector')
    const wrong = await bench.inspector.agent.delete(`/api/readings/${other.id}/photos/${body.id}`)
    const foreign = await stranger.agent.delete(`/api/readings/${bench.reading.id}/photos/${body.id}`)
    expect([wrong.status, foreign.status]).toEqual([404, 403])
  })
})
