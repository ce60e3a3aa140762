import { people } from './first-tables/people.ts'
import { jobs } from './first-tables/jobs.ts'
import { runs } from './first-tables/runs.ts'
import { ledger } from './first-tables/ledger.ts'

/** The house: people and sites, jobs and samples, runs and results, money, reports, and the ledger. */
export const sql = [people, jobs, runs, ledger].join('\n')
