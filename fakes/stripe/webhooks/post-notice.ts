export type NoticeAnswer = {
  accepted: boolean
  /** The status, or why there was none. */
  text: string
}

const timeoutMs = 10_000

/** One attempt. As with Stripe, only 2xx counts; a redirect is a failure. */
export async function postNotice(url: string, body: string, signature: string, stop: AbortSignal): Promise<NoticeAnswer> {
  try {
    const answer = await fetch(url, {
      method: 'POST',
      headers: { 'content-type': 'application/json; charset=utf-8', 'stripe-signature': signature, 'user-agent': 'Stripe/1.0 (stand-in)' },
      body,
      redirect: 'manual',
      signal: AbortSignal.any([stop, AbortSignal.timeout(timeoutMs)]),
    })
    await answer.body?.cancel()
    return { accepted: answer.ok, text: String(answer.status) }
  } catch (error) {
    return { accepted: false, text: reasonOf(error) }
  }
}

function reasonOf(error: unknown): string {
  if (!(error instanceof Error)) return String(error)
  return error.cause instanceof Error ? error.cause.message : error.message
}
