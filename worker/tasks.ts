import type { Task } from './task.ts'
import { planWork } from './tasks/plan-work.ts'
import { refundPayment } from './tasks/refund-payment.ts'

/** Every task. Nothing is found by scanning folders. */
export const tasks: readonly Task[] = [planWork, refundPayment]
