import { cleanup, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it } from 'vitest'
import { AuthorisationList } from '../../../src/components/people/authorisation-list.tsx'
import type { Authorisation } from '../../../shared/api/people.ts'

afterEach(cleanup)
const right = (methodTitle: string, what: Authorisation['right'], until: string): Authorisation => ({ id: `01a23210-0000-7000-8000-${methodTitle.length}${what.length}`.padEnd(36, '0'), personId: '01a23210-0000-7000-8000-000000000001', methodId: methodTitle.toLowerCase(), methodTitle, right: what, until })

describe('what a person is authorised for', () => {
  it('puts methods with the same rights and the same last day on one line', () => {
    render(<AuthorisationList authorisations={[right('Rockwell', 'carry out', '2999-08-31'), right('Rockwell', 'review', '2999-08-31'), right('Tensile', 'carry out', '2999-08-31'), right('Tensile', 'review', '2999-08-31')]} />)
    expect(screen.getAllByRole('listitem').map(({ textContent }) => textContent)).toEqual([expect.stringContaining('Carry out, review: Rockwell, Tensile until')])
  })

  it('says that a right has ended, after its last day', () => {
    render(<AuthorisationList authorisations={[right('Rockwell', 'carry out', '2020-01-01'), right('Tensile', 'carry out', '2999-08-31')]} />)
    expect(screen.getAllByRole('listitem').map(({ textContent }) => textContent)).toEqual([expect.stringContaining('Rockwell ended'), expect.stringContaining('Tensile until')])
  })
})
