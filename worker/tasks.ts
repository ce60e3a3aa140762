import type { Task } from './task.ts'
import { deliverReport } from './tasks/deliver-report.ts'
import { makeReport } from './tasks/make-report.ts'
import { planWork } from './tasks/plan-work.ts'
import { refundPayment } from './tasks/refund-payment.ts'
import { sendLink } from './tasks/send-link.ts'
import { tellOfHold } from './tasks/tell-of-hold.ts'

/** Every task. Nothing is found by scanning folders. */
export const tasks: readonly Task[] = [planWork, makeReport, deliverReport, tellOfHold, sendLink, refundPayment]
