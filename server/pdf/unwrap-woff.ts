import { inflateSync } from 'node:zlib'

const headerBytes = 44
const entryBytes = 20
const sfntHeaderBytes = 12
const sfntEntryBytes = 16

interface Table {
  tag: Buffer
  checksum: number
  bytes: Buffer
}

/**
 * The plain font in a WOFF 1.0 file (W3C recommendation of 2012). pdfkit reads WOFF too, but unpacks a whole table
 * anew for every glyph.
 */
export function unwrapWoff(woff: Buffer): Buffer {
  if (woff.toString('latin1', 0, 4) !== 'wOFF') throw new Error('This is no WOFF file')
  return sfntOf(woff.readUInt32BE(4), tablesOf(woff))
}

function tablesOf(woff: Buffer): Table[] {
  return Array.from({ length: woff.readUInt16BE(12) }, (_, i) => {
    const at = headerBytes + i * entryBytes
    const offset = woff.readUInt32BE(at + 4)
    const packed = woff.subarray(offset, offset + woff.readUInt32BE(at + 8))
    const isPacked = packed.length < woff.readUInt32BE(at + 12)
    return {
      tag: woff.subarray(at, at + 4),
      checksum: woff.readUInt32BE(at + 16),
      bytes: isPacked ? inflateSync(packed) : packed,
    }
  })
}

function sfntOf(flavour: number, tables: readonly Table[]): Buffer {
  const log2 = Math.floor(Math.log2(tables.length))
  const head = Buffer.alloc(sfntHeaderBytes + tables.length * sfntEntryBytes)
  head.writeUInt32BE(flavour, 0)
  head.writeUInt16BE(tables.length, 4)
  head.writeUInt16BE(16 * 2 ** log2, 6)
  head.writeUInt16BE(log2, 8)
  head.writeUInt16BE(16 * (tables.length - 2 ** log2), 10)
  let offset = head.length
  const bodies = tables.map(({ tag, checksum, bytes }, i) => {
    const at = sfntHeaderBytes + i * sfntEntryBytes
    tag.copy(head, at)
    head.writeUInt32BE(checksum, at + 4)
    head.writeUInt32BE(offset, at + 8)
    head.writeUInt32BE(bytes.length, at + 12)
    const padded = Buffer.alloc(Math.ceil(bytes.length / 4) * 4)
    bytes.copy(padded)
    offset += padded.length
    return padded
  })
  return Buffer.concat([head, ...bodies])
}
