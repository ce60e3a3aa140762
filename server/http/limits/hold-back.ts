import type { Request, RequestHandler } from 'express'
import type { Allowance } from '../../integrations/limits/create-limits.ts'
import { limits } from '../../integrations/limits/limits.ts'
import { addressOf } from '../address-of.ts'

/** Holds an address back that asks too often. */
export const holdBackAddress = (allowance: Allowance): RequestHandler => spend(allowance, addressOf)

/** Holds a signed-in person back that asks too often, from however many screens. */
export const holdBackPerson: RequestHandler = spend('person', (req) => req.caller?.person.id ?? null)

function spend(allowance: Allowance, keyOf: (req: Request) => string | null): RequestHandler {
  return async (req, _res, next) => {
    const key = keyOf(req)
    if (key !== null) await limits().spend(allowance, key)
    next()
  }
}
