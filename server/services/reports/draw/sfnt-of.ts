import { inflateSync } from 'node:zlib'

/**
 * A WOFF file as the TrueType file that it packs (W3C WOFF 1.0): pdfkit reads both, but unpacks a table of a WOFF anew for
 * every glyph, which takes a hundred times as long.
 */
export function sfntOf(woff: Buffer): Buffer {
  if (woff.toString('latin1', 0, 4) !== 'wOFF') throw new RangeError('this is not a WOFF file')
  const count = woff.readUInt16BE(12)
  const head = Buffer.alloc(12 + count * 16)
  woff.copy(head, 0, 4, 8)
  const power = 2 ** Math.floor(Math.log2(count))
  head.writeUInt16BE(count, 4)
  head.writeUInt16BE(power * 16, 6)
  head.writeUInt16BE(Math.log2(power), 8)
  head.writeUInt16BE((count - power) * 16, 10)
  const parts = [head]
  let end = head.length
  for (let at = 0; at < count; at += 1) {
    const entry = 44 + at * 20
    const [offset, packed, length] = [woff.readUInt32BE(entry + 4), woff.readUInt32BE(entry + 8), woff.readUInt32BE(entry + 12)]
    const stored = woff.subarray(offset, offset + packed)
    const table = packed < length ? inflateSync(stored) : stored
    const record = 12 + at * 16
    woff.copy(head, record, entry, entry + 4)
    woff.copy(head, record + 4, entry + 16, entry + 20)
    head.writeUInt32BE(end, record + 8)
    head.writeUInt32BE(length, record + 12)
    const padded = Buffer.alloc(Math.ceil(length / 4) * 4)
    table.copy(padded)
    parts.push(padded)
    end += padded.length
  }
  return Buffer.concat(parts)
}
