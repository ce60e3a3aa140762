import { settleOpenPayments } from '../server/services/billing/settle-open-payments.ts'
import { planLateSites } from '../server/services/planning/plan-late-sites.ts'

/** Chores that follow from no event, done every half minute by every worker; each is safe to do twice. */
export const sweeps: readonly (() => Promise<unknown>)[] = [planLateSites, () => settleOpenPayments()]
