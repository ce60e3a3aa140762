import * as z from 'zod'
import { Email, Id, Password } from './basics.ts'
import { endpoint } from './endpoint.ts'
import { Role } from './words.ts'

/** Who is signed in, and what the browser needs to know to draw their pages. */
export const Me = z.object({
  id: Id,
  name: z.string(),
  initials: z.string(),
  email: z.string(),
  role: Role,
  customerId: Id.nullable(),
  customerName: z.string().nullable(),
  siteIds: z.array(Id),
  /** The one site of a technician or manager of one site; "All sites"; or the customer's name. */
  place: z.string(),
  timeZone: z.string(),
})
export type Me = z.infer<typeof Me>

/** Null when nobody is signed in. */
export const Session = z.object({ me: Me.nullable(), company: z.string(), demo: z.boolean(), mailPage: z.string().nullable() })
export type Session = z.infer<typeof Session>

export const readSession = endpoint({ method: 'get', path: '/session', can: 'anyone', response: Session })

export const SignIn = z.strictObject({
  email: Email,
  password: z.string().min(1, 'is needed').max(128),
  /** A bench's shared screen is signed out after half an hour without a touch. */
  sharedScreen: z.boolean().default(false),
})
export const signIn = endpoint({ method: 'post', path: '/session', can: 'anyone', body: SignIn, response: Session })
export const signOut = endpoint({ method: 'delete', path: '/session', can: 'anyone', response: Session })
export const changePassword = endpoint({
  method: 'put', path: '/session/password', can: 'signed-in',
  body: z.strictObject({ current: z.string().min(1, 'is needed').max(128), next: Password }), response: Session,
})

/** Says the same whether the address is known or not. */
export const askPasswordReset = endpoint({ method: 'post', path: '/password-resets', can: 'anyone', body: z.strictObject({ email: Email }), response: z.object({ sent: z.literal(true) }) })

const Token = z.string().regex(/^[A-Za-z0-9_-]{20,100}$/, 'this link is not complete')
/** What an invitation or reset link is for, or `not-found` when it is used up or too old. */
export const readLink = endpoint({
  method: 'get', path: '/links/:token', can: 'anyone', params: z.strictObject({ token: Token }),
  response: z.object({ purpose: z.enum(['invitation', 'password reset']), email: z.string(), name: z.string() }),
})
/** Sets the password that an invitation or reset link asks for; the link works once. */
export const useLink = endpoint({ method: 'post', path: '/links/:token', can: 'anyone', params: z.strictObject({ token: Token }), body: z.strictObject({ password: Password }), response: Session })

export const sessionEndpoints = [readSession, signIn, signOut, changePassword, askPasswordReset, readLink, useLink]
