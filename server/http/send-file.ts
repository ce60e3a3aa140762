import type { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { Response } from 'express'

/**
 * Sends a file for saving, never for running: its type is fixed, its name is escaped, and even where a browser shows it, no script
 * of it runs in the product's name.
 */
export async function sendFile(res: Response, { name, mediaType, content }: { name: string; mediaType: string; content: Readable }): Promise<void> {
  res.attachment(name)
  res.set({
    'Content-Type': mediaType.startsWith('text/') ? `${mediaType}; charset=utf-8` : mediaType,
    'X-Content-Type-Options': 'nosniff',
    'Content-Security-Policy': "sandbox; default-src 'none'",
    'Cache-Control': 'private, no-store',
  })
  await pipeline(content, res)
}
