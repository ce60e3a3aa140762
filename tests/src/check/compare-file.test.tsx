import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { createHash, webcrypto } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { CompareFile } from '../../../src/components/check/compare-file.tsx'

// jsdom has no subtle cryptography, which every browser has over https.
beforeEach(() => vi.stubGlobal('crypto', webcrypto))
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const bytes = '%PDF-1.7 as it was issued'
const onRecord = createHash('sha256').update(bytes).digest('hex')
/** jsdom has files but no way to read one; browsers do. */
const drop = (content: string) => {
  const file = new File([content], 'report.pdf', { type: 'application/pdf' })
  Object.defineProperty(file, 'arrayBuffer', { value: () => Promise.resolve(Buffer.from(content)) })
  return userEvent.upload(screen.getByLabelText(/Drop the PDF here/), file)
}

describe('holding a file against the record', () => {
  it('says that it is the same when every byte is', async () => {
    render(<CompareFile onRecord={onRecord} />)
    await drop(bytes)
    expect(await screen.findByRole('heading', { name: 'The same, to the last byte' })).toBeTruthy()
  })

  it('says that it is not the same when one byte differs, and shows both fingerprints', async () => {
    render(<CompareFile onRecord={onRecord} />)
    await drop(`${bytes} `)
    expect(await screen.findByRole('heading', { name: 'Not the same' })).toBeTruthy()
    expect(screen.getByText('SHA-256 of your file').nextSibling?.textContent).not.toBe(screen.getByText('SHA-256 on record').nextSibling?.textContent)
  })
})
