import express, { type RequestHandler } from 'express'

const ordinary = express.json({ limit: '1mb' })
const large = express.json({ limit: '30mb' })

/** Where a whole curve of a pull may come: readings of a run, and cases for the engine. */
const largePaths = /^\/(test-runs\/[^/]+\/readings|evaluate)$/

/** JSON bodies of at most 1 MB, or 30 MB where curves come; strangers never get to send those. */
export const readJson: RequestHandler = (req, res, next) => (req.caller && largePaths.test(req.path) ? large : ordinary)(req, res, next)
