import * as z from 'zod'
import { Instant } from '../api/basics.ts'

const Dated = z.object({ from: Instant, to: Instant })
const Outcome = z.enum(['pass', 'fail', 'undecided'])
const Picture = z.object({
  title: z.string(), x: z.object({ label: z.string(), unit: z.string() }), y: z.object({ label: z.string(), unit: z.string() }),
  lines: z.array(z.object({ kind: z.enum(['curve', 'construction', 'dashed']), points: z.array(z.tuple([z.number(), z.number()])) })),
  marks: z.array(z.object({ x: z.number(), y: z.number(), label: z.string() })), window: z.object({ from: z.number(), to: z.number() }).optional(),
})

/** All that a report says, frozen when it is issued; the PDF is drawn from this and nothing else. Letters follow ISO/IEC 17025:2017, 7.8.2.1. */
export const ReportContent = z.object({
  /** a */ title: z.string(),
  /** b, c */ company: z.object({ name: z.string(), address: z.string(), email: z.string() }), site: z.object({ name: z.string(), address: z.string(), timeZone: z.string() }),
  /** d */ number: z.string(), revision: z.int(), code: z.string(), checkAddress: z.string(),
  /** 7.8.8: what a revision changed in the one it replaces */ supersedes: z.object({ number: z.string(), changes: z.array(z.string()) }).nullable(),
  /** e */ customer: z.object({ name: z.string(), address: z.string() }), purchaseOrder: z.string(), jobNumber: z.string(),
  /** g, h, i, j */ dates: z.object({ placed: Instant, received: Dated.nullable(), tested: Dated, reviewed: Dated, issued: Instant }),
  /** g */ samples: z.array(z.object({
    number: z.string(), heat: z.string(), lot: z.string(), material: z.string(), size: z.string(), condition: z.string(), receivedAt: Instant.nullable(), remarks: z.array(z.string()),
  })),
  /** f, 7.8.3.1: one entry for each way of testing; `samples` is empty where it holds for all that had this test */
  methods: z.array(z.object({ label: z.string(), standards: z.array(z.string()), lines: z.array(z.string()), equipment: z.array(z.string()), samples: z.array(z.string()) })),
  /** m: results with units, a row for each sample. `head` stands over the unit: a symbol, or a name where the unit is the symbol */
  columns: z.array(z.object({ key: z.string(), group: z.string(), head: z.string(), symbol: z.string(), unit: z.string(), name: z.string() })),
  rows: z.array(z.object({
    sample: z.string(), outcome: Outcome.nullable(),
    cells: z.record(z.string(), z.object({ reported: z.string(), number: z.string(), uncertainty: z.number().nullable(), outcome: Outcome.nullable() })),
    /** Why there is no number, by column. */ missing: z.record(z.string(), z.string()),
  })),
  /** By column, where one limit holds for all samples. */ limits: z.record(z.string(), z.string()),
  uncertainties: z.record(z.string(), z.string()), coverage: z.string(),
  /** m: what else the tests gave, a table for each way of testing */
  further: z.array(z.object({ label: z.string(), columns: z.array(z.object({ symbol: z.string(), unit: z.string(), name: z.string() })), rows: z.array(z.object({ sample: z.string(), cells: z.array(z.string()) })) })),
  /** 7.8.6 */ conformity: z.object({ statement: z.string(), rule: z.string(), outcome: Outcome, findings: z.array(z.string()), limits: z.array(z.string()) }).nullable(),
  /** Every single reading that counts, for those who want to work it out again. */
  readings: z.array(z.object({ sample: z.string(), label: z.string(), columns: z.array(z.string()), rows: z.array(z.array(z.string())), /** What was struck out and why, and how it was done where that differs. */ notes: z.array(z.string()) })),
  conversions: z.array(z.object({ sample: z.string(), of: z.string(), table: z.string(), caution: z.string(), values: z.array(z.object({ scale: z.string(), reported: z.string(), informative: z.boolean() })) })),
  pictures: z.array(z.object({ sample: z.string(), picture: Picture })),
  /** n: additions to, deviations or exclusions from the method */ deviations: z.array(z.string()),
  /** k, l, p and what else has to be said */ statements: z.array(z.string()),
  /** o */ signatory: z.object({ name: z.string(), role: z.string() }), reviewers: z.array(z.string()), testers: z.array(z.string()),
})
export type ReportContent = z.infer<typeof ReportContent>
