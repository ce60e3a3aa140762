import { crc32 } from 'node:zlib'

/** A zip archive with its entries stored, not packed: enough to look like an office document. */
export function writeZip(entries: Record<string, string>): Buffer {
  const locals: Buffer[] = []
  const directory: Buffer[] = []
  let offset = 0
  for (const [name, text] of Object.entries(entries)) {
    const content = Buffer.from(text)
    const nameBytes = Buffer.from(name)
    const fields = Buffer.alloc(26)
    fields.writeUInt16LE(20, 0)
    fields.writeUInt32LE(crc32(content), 10)
    fields.writeUInt32LE(content.length, 14)
    fields.writeUInt32LE(content.length, 18)
    fields.writeUInt16LE(nameBytes.length, 22)
    const local = Buffer.concat([Buffer.from('PK\x03\x04'), fields, nameBytes, content])
    const tail = Buffer.alloc(14)
    tail.writeUInt32LE(offset, 10)
    directory.push(Buffer.concat([Buffer.from('PK\x01\x02'), Buffer.from([20, 0]), fields, tail, nameBytes]))
    locals.push(local)
    offset += local.length
  }
  const central = Buffer.concat(directory)
  const end = Buffer.alloc(18)
  end.writeUInt16LE(directory.length, 4)
  end.writeUInt16LE(directory.length, 6)
  end.writeUInt32LE(central.length, 8)
  end.writeUInt32LE(offset, 12)
  return Buffer.concat([...locals, central, Buffer.from('PK\x05\x06'), end])
}
