import type { Router } from 'express'
import { issueReport as issueEndpoint } from '../../shared/api/jobs.ts'
import * as api from '../../shared/api/reports.ts'
import { addressOf } from '../http/address-of.ts'
import { route } from '../http/route.ts'
import { sendFile } from '../http/send-file.ts'
import { checkReport } from '../services/reports/check-report.ts'
import { downloadReport } from '../services/reports/download-report.ts'
import { issueReport } from '../services/reports/issue-report.ts'
import { listReports } from '../services/reports/list-reports.ts'
import { readReport } from '../services/reports/read-report.ts'

export function reportRoutes(router: Router): void {
  route(router, api.listReports, ({ query }, caller) => listReports(query, caller))
  route(router, api.readReport, ({ params }, caller) => readReport(params.reportId, caller))
  route(router, api.downloadReport, async ({ params }, caller, { res }) => {
    await sendFile(res, await downloadReport(params.reportId, caller))
    return undefined
  })
  route(router, api.checkReport, ({ query }) => checkReport(query))
  route(router, issueEndpoint, ({ params, body }, caller, { req }) => issueReport(params.jobId, { ...body, address: addressOf(req) }, caller))
}
