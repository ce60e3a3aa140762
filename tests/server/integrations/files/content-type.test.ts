import { Readable } from 'node:stream'
import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { contentType } from '../../../../server/integrations/files/content-type.ts'
import { writeZip } from './write-zip.ts'

const picture = sharp({ create: { width: 8, height: 8, channels: 3, background: '#445566' } })
const pdf = Buffer.from('%PDF-1.7\n1 0 obj\n<<>>\nendobj\n%%EOF\n')
const exe = Buffer.concat([Buffer.from('MZ\x90\0\x03\0\0\0\x04\0\0\0', 'latin1'), Buffer.alloc(400)])
const csv = Buffer.from('sample,HV10\r\nJ-26-00417-01,"250,5"\r\n')

const officePart = (part: string, type: string) =>
  writeZip({
    '[Content_Types].xml': `<?xml version="1.0"?><Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"><Override PartName="/${part}" ContentType="application/vnd.openxmlformats-officedocument.${type}.main+xml"/></Types>`,
    [part]: '<x/>',
  })
const docx = officePart('word/document.xml', 'wordprocessingml.document')
const xlsx = officePart('xl/workbook.xml', 'spreadsheetml.sheet')

const read = (content: Buffer, name: string) => contentType(() => Promise.resolve(Readable.from([content])), name)

describe('the type of a file', () => {
  it.each([
    ['order.pdf', pdf, 'application/pdf'],
    ['heat.CSV', csv, 'text/csv'],
    ['machine.txt', csv, 'text/plain'],
    ['Prüfung.txt', Buffer.from('Härte µ ± ≥ σ\n'), 'text/plain'],
    ['old machine.dat', Buffer.from('H\xe4rte \xb5 \xb1\r\n', 'latin1'), 'text/plain'],
    ['order.docx', docx, 'application/vnd.openxmlformats-officedocument.wordprocessingml.document'],
    ['order.xlsx', xlsx, 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet'],
  ])('is told for %s', async (name, content, type) => expect(await read(content, name)).toBe(type))

  it.each([
    ['png', 'png', 'image/png'],
    ['jpg', 'jpeg', 'image/jpeg'],
    ['jpeg', 'jpeg', 'image/jpeg'],
    ['tif', 'tiff', 'image/tiff'],
  ] as const)('is told for a picture named .%s', async (extension, format, type) => {
    const content = await picture.clone().toFormat(format).toBuffer()
    expect(await read(content, `micrograph 1.${extension}`)).toBe(type)
  })

  it('does not depend on how the content arrives', async () => {
    const pieces = () => Promise.resolve(Readable.from(Array.from(docx, (byte) => Buffer.of(byte))))
    expect(await contentType(pieces, 'order.docx')).toContain('wordprocessingml')
  })
})

describe('a file is refused', () => {
  it.each([
    ['a program renamed to .pdf', exe, 'invoice.pdf', /application\/x-msdownload, which is not accepted/],
    ['a program renamed to .csv', exe, 'heat.csv', /which is not accepted/],
    ['a program under its own name', exe, 'setup.exe', /ending in \.exe is not accepted; accepted are pdf, png/],
    ['a PDF called .csv', pdf, 'heat.csv', /the content is application\/pdf, but the name ends in \.csv/],
    ['a PDF called .png', pdf, 'micrograph.png', /the content is application\/pdf, but the name ends in \.png/],
    ['a spreadsheet called .docx', xlsx, 'order.docx', /spreadsheetml\.sheet, but the name ends in \.docx/],
    ['a plain archive called .docx', writeZip({ 'a.txt': 'a' }), 'order.docx', /application\/zip, which is not accepted/],
    ['text called .pdf', csv, 'order.pdf', /the content is not what \.pdf says/],
    ['a web page called .txt', Buffer.from('  <!doctype html><script>alert(1)</script>'), 'notes.txt', /not what \.txt says/],
    ['a drawing with script called .txt', Buffer.from('\ufeff<svg onload="alert(1)">'), 'notes.txt', /not what \.txt says/],
    ['bytes called .csv', Buffer.from([0x41, 0x00, 0x01, 0x02]), 'heat.csv', /not what \.csv says/],
    ['bytes after much text', Buffer.concat([Buffer.alloc(200_000, 'a,b\n'), Buffer.from([0])]), 'heat.csv', /not what \.csv says/],
    ['an empty file', Buffer.alloc(0), 'heat.csv', /not what \.csv says/],
    ['a file without extension', csv, 'heat', /without an extension is not accepted/],
    ['a double extension', pdf, 'order.pdf.exe', /ending in \.exe/],
  ])('%s', async (_what, content, name, message) => {
    const answer = read(content, name)
    await expect(answer).rejects.toMatchObject({ name: 'FileError', reason: 'not-allowed' })
    await expect(answer).rejects.toThrow(message)
  })

  it('a PNG called .pdf', async () => {
    await expect(read(await picture.clone().png().toBuffer(), 'order.pdf')).rejects.toThrow('the content is image/png, but the name ends in .pdf')
  })
})
