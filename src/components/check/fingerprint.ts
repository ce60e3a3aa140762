/** SHA-256 of a file as lower-case hexadecimal, worked out in the browser; throws where the page was not opened over a safe connection. */
export async function fingerprint(file: Blob): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', await file.arrayBuffer())
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('')
}

/** In groups of eight, so that two can be held side by side. */
export function grouped(sha256: string): string {
  return sha256.replace(/(.{8})(?=.)/g, '$1 ')
}
