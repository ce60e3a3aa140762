import type { Response } from 'express'
import { html, type Html } from './html.ts'

export type Page = {
  title: string
  body: Html
  /** A narrow column, for a form. */
  narrow?: boolean
  /** Loads itself again after so many seconds, without script. */
  refreshSeconds?: number
  /** Origins a form may lead on to, beside our own. */
  formTargets?: string[]
  status?: number
}

/** Answers with a page under a strict content policy: no script at all, style from here only. */
export function sendPage(res: Response, { title, body, narrow = false, refreshSeconds, formTargets = [], status = 200 }: Page): void {
  const page = html`<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
${refreshSeconds === undefined ? '' : html`<meta http-equiv="refresh" content="${refreshSeconds}">`}
<title>${title}</title>
<link rel="stylesheet" href="/page.css">
<link rel="icon" href="data:,">
</head>
<body><main${narrow ? html` class="narrow"` : ''}>${body}</main></body>
</html>`
  const policy = [
    "default-src 'none'",
    "style-src 'self'",
    'img-src data:',
    "frame-src 'self'",
    `form-action 'self' ${formTargets.join(' ')}`.trim(),
    "base-uri 'none'",
    "frame-ancestors 'none'",
  ]
  res.status(status).set({ 'content-security-policy': policy.join('; '), 'cache-control': 'no-store' }).type('html').send(page.text)
}
