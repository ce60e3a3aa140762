import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query'
import * as api from '../../shared/api/reports.ts'
import { addressOf, call } from '../lib/call.ts'

export const reportsQuery = (filter: { search?: string }) => infiniteQueryOptions({
  queryKey: ['Report', 'list', filter], queryFn: ({ pageParam }) => call(api.listReports, { query: { ...filter, after: pageParam } }),
  initialPageParam: undefined as string | undefined, getNextPageParam: ({ next }) => next ?? undefined,
})
export const reportQuery = (reportId: string) => queryOptions({ queryKey: ['Report', 'one', reportId], queryFn: () => call(api.readReport, { params: { reportId } }) })
export const reportFile = (reportId: string) => addressOf(api.downloadReport, { reportId })
export const reportCheckQuery = (asked: { number: string; code: string }) => queryOptions({ queryKey: ['ReportCheck', 'one', asked], queryFn: () => call(api.checkReport, { query: asked }), enabled: asked.number !== '' && asked.code !== '', retry: false })

export const invoicesQuery = infiniteQueryOptions({
  queryKey: ['Invoice', 'list'], queryFn: ({ pageParam }) => call(api.listInvoices, { query: { after: pageParam } }),
  initialPageParam: undefined as string | undefined, getNextPageParam: ({ next }) => next ?? undefined,
})
export const invoiceQuery = (invoiceId: string) => queryOptions({ queryKey: ['Invoice', 'one', invoiceId], queryFn: () => call(api.readInvoice, { params: { invoiceId } }) })
