import { setImmediate } from 'node:timers/promises'
import { toSVG } from 'bwip-js/node'
import { sizeText } from '../../../shared/orders/size-text.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { loadOne } from '../../models/load.ts'
import { jobView } from './view/job-view.ts'

/** Drawn between two answers to other requests; each takes about 2 ms. */
const codesAtOnce = 10

/** What is printed for the parcel: the packing slip and a label for each sample, with codes that a scanner reads. */
export async function readLabels(jobId: string, caller: Caller) {
  const row = await loadOne(Job, 'Job', jobId, caller)
  if (row.state === 'draft' || row.state === 'cancelled') throw new Problem('not-now', `job ${row.number} is ${row.state}; labels are printed once it is placed`)
  const job = await jobView(jobId, caller)
  const codes = new Map((await Sample.findAll({ where: { jobId }, attributes: ['id', 'code'], raw: true })).map(({ id, code }) => [id, code]))
  const labels = []
  for (const [at, { id, number, heat, lot, material, piece, tests, traveller }] of job.samples.entries()) {
    if (at % codesAtOnce === 0) await setImmediate()
    labels.push({ number, code: codeOf(codes.get(id) ?? number), heat, lot, material, size: [piece.form, sizeText(piece)].filter(Boolean).join(' '), tests: tests.map(({ label }) => label), traveller })
  }
  const { number, customerName, siteName, siteAddress, order } = job
  return { jobNumber: number, jobCode: codeOf(number), customerName, purchaseOrder: order.purchaseOrder, siteName, siteAddress, afterwards: order.afterwards, labels }
}

/** A Data Matrix (ISO/IEC 16022) as SVG, with the quiet zone of one module that it asks for. */
function codeOf(text: string): string {
  return toSVG({ bcid: 'datamatrix', text, scale: 2, padding: 2 })
}
