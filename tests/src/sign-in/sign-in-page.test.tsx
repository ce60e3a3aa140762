import '../../support/setup-database.ts'
import { QueryClientProvider } from '@tanstack/react-query'
import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { createQueryClient } from '../../../src/lib/query-client.ts'
import { routes } from '../../../src/routes.tsx'
import { startTestApp } from '../../support/app.ts'
import { browserFetch } from '../../support/browser-fetch.ts'
import { buildHouse } from '../../support/build/house.ts'
import { testPassword } from '../../support/build/people.ts'

const app = await startTestApp()
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

function open(at: string) {
  vi.stubGlobal('fetch', browserFetch(app.agent()))
  const router = createMemoryRouter(routes, { initialEntries: [at] })
  render(<QueryClientProvider client={createQueryClient()}><RouterProvider router={router} /></QueryClientProvider>)
  return router
}
const email = () => screen.findByRole('textbox', { name: 'Email' }, { timeout: 20_000 })

describe('the sign-in page', () => {
  it('brings a person to the page they asked for', async () => {
    const { technician } = await buildHouse()
    const router = open('/me')
    await userEvent.type(await email(), technician.email)
    await userEvent.type(screen.getByLabelText('Password'), testPassword)
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }))
    expect(await screen.findByRole('heading', { level: 1, name: technician.name }, { timeout: 20_000 })).toBeTruthy()
    expect(router.state.location.pathname).toBe('/me')
  })

  it('says plainly that address or password is not right, and empties the password only', async () => {
    const { technician } = await buildHouse()
    open('/sign-in')
    await userEvent.type(await email(), technician.email)
    await userEvent.type(screen.getByLabelText('Password'), 'not this one at all')
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }))
    expect((await screen.findByRole('alert')).textContent).toContain('The e-mail address or the password is not right.')
    expect(screen.getByLabelText<HTMLInputElement>('Password').value).toBe('')
    expect(screen.getByRole<HTMLInputElement>('textbox', { name: 'Email' }).value).toBe(technician.email)
  })

  it('asks for what is missing beside its field and sends nothing', async () => {
    open('/sign-in')
    await userEvent.type(await email(), 'no address')
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }))
    expect(await screen.findByText('Has to be an address like name@company.example.')).toBeTruthy()
    expect(screen.getByText('Is needed.')).toBeTruthy()
  })

  it('explains a link that is used up and leads on', async () => {
    open('/links/this-link-was-used-long-ago')
    expect(await screen.findByRole('heading', { name: 'This link does not work' }, { timeout: 20_000 })).toBeTruthy()
    expect(screen.getByRole('link', { name: 'Ask for a new link' }).getAttribute('href')).toBe('/forgotten')
  })
})
