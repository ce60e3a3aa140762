import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { File } from '../../server/models/jobs/file.ts'
import { Sample } from '../../server/models/jobs/sample.ts'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildDraft, buildOffers, buildPlacedJob } from '../support/build/jobs.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()
const png = await sharp({ create: { width: 3000, height: 1500, channels: 3, background: '#888' } }).png().toBuffer()
const jpegWithPlace = await sharp({ create: { width: 40, height: 20, channels: 3, background: '#333' } }).withExif({ IFD0: { Copyright: 'where it was taken' } }).jpeg().toBuffer()

async function start() {
  const house = await buildHouse()
  await buildOffers(house.site.id)
  return { ...house, agent: await app.agentFor(house.client) }
}

describe('an attachment', () => {
  it('comes back as it was, named safely, and can run nothing', async () => {
    const house = await start()
    const draft = await buildDraft(house)
    const { body: file } = await house.agent.post(`/api/jobs/${draft.id}/files`).attach('file', Buffer.from('heat;lot\n7K;B\n'), { filename: '../../größe "x".csv' }).expect(200)
    expect(file).toMatchObject({ name: 'größe x.csv', mediaType: 'text/csv', size: 14, purpose: 'attachment', sampleId: null })
    const got = await house.agent.get(`/api/files/${file.id}`).buffer(true).parse((res, done) => { const parts: Buffer[] = []; res.on('data', (part: Buffer) => parts.push(part)); res.on('end', () => done(null, Buffer.concat(parts))) }).expect(200)
    expect(got.body.toString()).toBe('heat;lot\n7K;B\n')
    expect(got.headers).toMatchObject({ 'content-type': 'text/csv; charset=utf-8', 'x-content-type-options': 'nosniff', 'content-security-policy': "sandbox; default-src 'none'" })
    expect(got.headers['content-disposition']).toMatch(/^attachment; filename=/)
    expect((await house.agent.get(`/api/jobs/${draft.id}`)).body.files).toHaveLength(1)
    expect((await eventsOf(file.id)).map(({ type }) => type)).toEqual(['file.added'])
  })

  it('is told by its content: a page dressed as a picture is refused and leaves nothing', async () => {
    const house = await start()
    const draft = await buildDraft(house)
    for (const [name, content] of [['photo.png', '<html><script>alert(1)</script></html>'], ['page.html', '<p>hello'], ['list.csv', '<svg onload=alert(1)>'], ['drawing.pdf', png], ['empty.csv', '']] as const) {
      const { body } = await house.agent.post(`/api/jobs/${draft.id}/files`).attach('file', Buffer.from(content), { filename: name }).expect(422)
      expect(body.fields).toHaveProperty('file')
    }
    expect(await File.count({ where: { jobId: draft.id } })).toBe(0)
  })

  it('above 25 MB is refused, and so is none and two', async () => {
    const house = await start()
    const draft = await buildDraft(house)
    const { body } = await house.agent.post(`/api/jobs/${draft.id}/files`).attach('file', Buffer.alloc(25 * 1024 * 1024 + 1, 65), { filename: 'big.txt' }).expect(413)
    expect(body.code).toBe('too-large')
    await house.agent.post(`/api/jobs/${draft.id}/files`).field('x', '1').expect(422)
    await house.agent.post(`/api/jobs/${draft.id}/files`).send({}).expect(422)
    await house.agent.post(`/api/jobs/${draft.id}/files`).attach('file', Buffer.from('a'), 'a.txt').attach('file', Buffer.from('b'), 'b.txt').expect(422)
    expect(await File.count({ where: { jobId: draft.id } })).toBe(0)
  })

  it('is taken off a draft, and stays once the job is placed', async () => {
    const house = await start()
    const draft = await buildDraft(house)
    const add = async (jobId: string) => (await house.agent.post(`/api/jobs/${jobId}/files`).attach('file', Buffer.from('a,b\n'), 'a.csv').expect(200)).body.id as string
    const first = await add(draft.id)
    await house.agent.delete(`/api/files/${first}`).expect(200, { removed: true })
    await house.agent.delete(`/api/files/${first}`).expect(404)
    await house.agent.get(`/api/files/${first}`).expect(404)
    expect((await house.agent.get(`/api/jobs/${draft.id}`)).body.files).toEqual([])
    const second = await add((await buildPlacedJob(house)).id)
    expect((await house.agent.delete(`/api/files/${second}`).expect(409)).body.code).toBe('not-now')
  })
})

describe('a photo of a sample', () => {
  it('is made anew for display, smaller and without what the camera wrote, and the customer sees it', async () => {
    const house = await start()
    const job = await buildPlacedJob(house)
    const sample = await Sample.findOne({ where: { jobId: job.id, position: 1 }, raw: true })
    const bench = await app.agentFor(house.technician)
    const { body: large } = await bench.post(`/api/samples/${sample?.id}/photos`).attach('file', png, 'stamp.png').expect(200)
    const { body: shown } = await house.agent.get(`/api/files/${large.id}?as=display`).expect(200)
    expect(await sharp(shown).metadata()).toMatchObject({ format: 'png', width: 2400, height: 1200 })
    const { body: original } = await house.agent.get(`/api/files/${large.id}`).expect(200)
    expect(Buffer.compare(original, png)).toBe(0)
    const { body: small } = await bench.post(`/api/samples/${sample?.id}/photos`).attach('file', jpegWithPlace, 'place.jpg').expect(200)
    expect((await sharp(jpegWithPlace).metadata()).exif).toBeDefined()
    expect((await sharp((await house.agent.get(`/api/files/${small.id}?as=display`).expect(200)).body).metadata()).exif).toBeUndefined()
    await bench.post(`/api/samples/${sample?.id}/photos`).attach('file', Buffer.from('a,b\n'), 'a.csv').expect(422)
    await house.agent.post(`/api/samples/${sample?.id}/photos`).attach('file', png, 'stamp.png').expect(403)
  })
})

describe('another customer', () => {
  it('finds no file, neither to read nor to remove', async () => {
    const house = await start()
    const draft = await buildDraft(house)
    const { body: file } = await house.agent.post(`/api/jobs/${draft.id}/files`).attach('file', Buffer.from('a,b\n'), 'a.csv').expect(200)
    const stranger = await app.agentFor((await buildHouse()).client)
    await stranger.get(`/api/files/${file.id}`).expect(404)
    await stranger.delete(`/api/files/${file.id}`).expect(404)
    await app.agent().get(`/api/files/${file.id}`).expect(401)
  })

  it('and the customer itself find no file that is the lab\'s own', async () => {
    const house = await start()
    const job = await buildPlacedJob(house)
    const { body: file } = await house.agent.post(`/api/jobs/${job.id}/files`).attach('file', Buffer.from('a,b\n'), 'a.csv').expect(200)
    await File.update({ visibleToCustomer: false, purpose: 'record' }, { where: { id: file.id } })
    await house.agent.get(`/api/files/${file.id}`).expect(404)
    expect((await house.agent.get(`/api/jobs/${job.id}`)).body.files).toEqual([])
    await (await app.agentFor(house.technician)).get(`/api/files/${file.id}`).expect(200)
  })
})
