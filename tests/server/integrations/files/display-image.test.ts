import { crc32, deflateSync } from 'node:zlib'
import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { displayImage } from '../../../../server/integrations/files/display-image.ts'

const create = (width: number, height: number) => sharp({ create: { width, height, channels: 3, background: '#445566' } })

/** A small PNG file that claims to be as large as its header says. */
function claimingPng(width: number, height: number): Buffer {
  const chunk = (type: string, data: Buffer) => {
    const body = Buffer.concat([Buffer.from(type), data])
    const frame = Buffer.alloc(8)
    frame.writeUInt32BE(data.length, 0)
    frame.writeUInt32BE(crc32(body), 4)
    return Buffer.concat([frame.subarray(0, 4), body, frame.subarray(4)])
  }
  const header = Buffer.alloc(13)
  header.writeUInt32BE(width, 0)
  header.writeUInt32BE(height, 4)
  header.set([1, 0, 0, 0, 0], 8)
  const signature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])
  return Buffer.concat([signature, chunk('IHDR', header), chunk('IDAT', deflateSync(Buffer.alloc(1_000_000))), chunk('IEND', Buffer.alloc(0))])
}

describe('a picture for display', () => {
  it('is made smaller and keeps its proportions; the original size is told for the scale', async () => {
    const image = await displayImage(await create(4800, 1200).tiff({ compression: 'lzw' }).toBuffer())
    expect(image).toMatchObject({ contentType: 'image/jpeg', widthPx: 2400, heightPx: 600, originalWidthPx: 4800, originalHeightPx: 1200 })
    expect(await sharp(image.content).metadata()).toMatchObject({ format: 'jpeg', width: 2400, height: 600 })
  })

  it('stays a PNG when it was one, and is never enlarged', async () => {
    const image = await displayImage(await create(40, 30).png().toBuffer())
    expect(image).toMatchObject({ contentType: 'image/png', widthPx: 40, heightPx: 30 })
    const [red, green, blue] = await sharp(image.content).raw().toBuffer()
    expect([red, green, blue]).toEqual([0x44, 0x55, 0x66])
  })

  it('loses place and camera, and stands upright', async () => {
    const original = await create(60, 20).withMetadata({ orientation: 6 }).withExifMerge({ IFD0: { Artist: 'Somebody' } }).jpeg().toBuffer()
    const image = await displayImage(original)
    expect(image).toMatchObject({ widthPx: 20, heightPx: 60, originalWidthPx: 20, originalHeightPx: 60 })
    expect(image.content.includes('Somebody')).toBe(false)
    expect(original.includes('Somebody')).toBe(true)
  })

  it('is made from a 16-bit grey TIFF, as microscopes write', async () => {
    const grey = new Uint16Array(64 * 64).fill(0x8000)
    const original = await sharp(grey, { raw: { width: 64, height: 64, channels: 1 } }).toColourspace('grey16').tiff({ compression: 'lzw' }).toBuffer()
    expect(await sharp(original).metadata()).toMatchObject({ depth: 'ushort' })
    const image = await displayImage(original)
    const [level = 0] = await sharp(image.content).raw().toBuffer()
    expect(level).toBeGreaterThan(120)
    expect(level).toBeLessThan(136)
  })
})

describe('a picture is refused', () => {
  it('above the limit in pixels, from its header, before anything is decoded', async () => {
    const before = process.memoryUsage().rss
    const answer = displayImage(claimingPng(60_000, 60_000))
    await expect(answer).rejects.toMatchObject({ name: 'FileError', reason: 'bad-picture' })
    await expect(answer).rejects.toThrow('the picture has 3600.0 megapixels (60000 × 60000), the limit is 80.0')
    expect(process.memoryUsage().rss - before).toBeLessThan(100 * 1024 * 1024)
    await expect(displayImage(await create(1001, 1000).jpeg().toBuffer(), 1_000_000)).rejects.toThrow('the limit is 1.0')
  })

  it('when it breaks off', async () => {
    const whole = await create(800, 800).png({ compressionLevel: 0 }).toBuffer()
    await expect(displayImage(whole.subarray(0, whole.length / 2))).rejects.toThrow('damaged')
  })

  it.each([
    ['text', Buffer.from('no picture')],
    ['an SVG', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><rect width="9" height="9"/></svg>')],
    ['a GIF', Buffer.from('R0lGODlhAQABAIAAAAAAAP///yH5BAEAAAAALAAAAAABAAEAAAIBRAA7', 'base64')],
  ])('when it is %s', async (_what, content) => {
    await expect(displayImage(content)).rejects.toThrow('no readable PNG, JPEG or TIFF picture')
  })
})
