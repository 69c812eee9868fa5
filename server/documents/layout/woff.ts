import { inflateSync } from 'node:zlib'

/**
 * Unpacks a WOFF 1.0 font file to the plain font within it (W3C WOFF 1.0, sections 3 to 5), so that it is inflated once for all
 * documents and not again at each look into a table.
 * @throws Error when the bytes are no WOFF 1.0 file
 */
export function unpackWoff(woff: Buffer): Buffer {
  if (woff.toString('latin1', 0, 4) !== 'wOFF') throw new Error('Not a WOFF 1.0 font file.')
  const count = woff.readUInt16BE(12)
  const tables = Array.from({ length: count }, (_, index) => {
    const entry = 44 + index * 20
    const [offset, packed, length, checksum] = [4, 8, 12, 16].map((at) => woff.readUInt32BE(entry + at)) as [number, number, number, number]
    const bytes = woff.subarray(offset, offset + packed)
    return { tag: woff.subarray(entry, entry + 4), checksum, bytes: packed < length ? inflateSync(bytes) : bytes }
  })
  const power = 2 ** Math.floor(Math.log2(count))
  const head = Buffer.alloc(12 + count * 16)
  head.writeUInt32BE(woff.readUInt32BE(4), 0)
  head.writeUInt16BE(count, 4)
  head.writeUInt16BE(power * 16, 6)
  head.writeUInt16BE(Math.log2(power), 8)
  head.writeUInt16BE((count - power) * 16, 10)
  let at = head.length
  const body = tables.flatMap(({ tag, checksum, bytes }, index) => {
    const entry = 12 + index * 16
    tag.copy(head, entry)
    head.writeUInt32BE(checksum, entry + 4)
    head.writeUInt32BE(at, entry + 8)
    head.writeUInt32BE(bytes.length, entry + 12)
    const padding = Buffer.alloc((4 - (bytes.length % 4)) % 4)
    at += bytes.length + padding.length
    return [bytes, padding]
  })
  return Buffer.concat([head, ...body])
}
