import type { Router } from 'express'
import * as api from '../../shared/api/files.ts'
import { receiveUpload } from '../http/receive-upload.ts'
import { route } from '../http/route.ts'
import { sendFile } from '../http/send-file.ts'
import { addPhoto } from '../services/files/add-photo.ts'
import { addRecord } from '../services/files/add-record.ts'
import { attachFile } from '../services/files/attach-file.ts'
import { downloadFile } from '../services/files/download-file.ts'
import { removeFile } from '../services/files/remove-file.ts'

export function fileRoutes(router: Router): void {
  route(router, api.attachFile, ({ params }, caller, { req, res }) => attachFile(params.jobId, () => receiveUpload(req, res), caller))
  route(router, api.addPhoto, ({ params }, caller, { req, res }) => addPhoto(params.sampleId, () => receiveUpload(req, res), caller))
  route(router, api.addRecord, ({ params }, caller, { req, res }) => addRecord(params.testRunId, () => receiveUpload(req, res), caller))
  route(router, api.downloadFile, async ({ params, query }, caller, { res }) => {
    await sendFile(res, await downloadFile(params.fileId, query.as, caller))
    return undefined
  })
  route(router, api.removeFile, ({ params }, caller) => removeFile(params.fileId, caller))
}
