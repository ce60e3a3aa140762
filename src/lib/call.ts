import * as z from 'zod'
import type { Endpoint } from '../../shared/api/endpoint.ts'
import { problems, type ProblemCode } from '../../shared/problems.ts'
import { Refusal } from './refusal.ts'

type Given<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> =
  (Record<string, never> extends z.input<P> ? { params?: z.input<P> } : { params: z.input<P> })
  & { query?: z.input<Q> }
  & (Record<string, never> extends z.input<B> ? { body?: z.input<B> } : { body: z.input<B> })
  & { signal?: AbortSignal }

const ProblemAnswer = z.object({ code: z.string(), detail: z.string(), fields: z.record(z.string(), z.string()).default({}), requestId: z.string().optional() })

/** Calls an operation of the server; throws a `Refusal` when it says no or cannot be reached. */
export async function call<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(e: Endpoint<P, Q, B, R>, given: Given<P, Q, B>): Promise<z.infer<R>> {
  const hasBody = e.method !== 'get' && e.method !== 'delete'
  const response = await reach(addressOf(e, given.params, given.query), {
    method: e.method.toUpperCase(), signal: given.signal, credentials: 'same-origin',
    ...(hasBody && { body: JSON.stringify(given.body ?? {}), headers: { 'content-type': 'application/json' } }),
  })
  return e.response.parse(await response.json())
}

/** The address of an operation, for links and downloads too. */
export function addressOf(e: Pick<Endpoint, 'path'>, params: unknown = {}, query: unknown = {}): string {
  const path = e.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String((params as Record<string, unknown>)[name])))
  const search = new URLSearchParams(Object.entries((query ?? {}) as Record<string, string | number | boolean | null | undefined>).flatMap(([key, value]) => (value === undefined || value === null || value === '' ? [] : [[key, String(value)]])))
  return `/api${path}${search.size > 0 ? `?${search.toString()}` : ''}`
}

async function reach(address: string, init: RequestInit): Promise<Response> {
  let response: Response
  try {
    response = await fetch(address, init)
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error
    throw new Refusal('unreachable', 'The server cannot be reached.')
  }
  if (!response.ok) throw refusalOf(response, await response.text())
  return response
}

function refusalOf(response: { status: number }, text: string): Refusal {
  try {
    const { code, detail, fields, requestId } = ProblemAnswer.parse(JSON.parse(text))
    if (code in problems) return new Refusal(code as ProblemCode, detail, fields, requestId)
  } catch {
    // no answer of ours: a proxy, or a server that is just starting
  }
  return new Refusal(response.status >= 500 ? 'unavailable' : 'unexpected', 'The server did not answer as it should.')
}

/** Sends one file with its progress, 0 to 1. XMLHttpRequest, since fetch tells nothing of what is sent. */
export function sendFile<P extends z.ZodType, R extends z.ZodType>(e: Endpoint<P, z.ZodType, z.ZodType, R>, params: z.input<P>, file: File, onProgress: (share: number) => void): Promise<z.infer<R>> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest()
    request.open(e.method.toUpperCase(), addressOf(e, params))
    request.upload.onprogress = ({ loaded, total }) => onProgress(total > 0 ? loaded / total : 0)
    request.onerror = () => reject(new Refusal('unreachable', 'The server cannot be reached.'))
    request.onload = () => {
      if (request.status >= 400) reject(refusalOf(request, request.responseText))
      else resolve(e.response.parse(JSON.parse(request.responseText)))
    }
    const form = new FormData()
    form.append('file', file)
    request.send(form)
  })
}
