import * as z from 'zod'
import { mailHold } from '../../server/services/mails/mail-hold.ts'
import { task } from '../task.ts'

/** Tells a customer's people that a sample waits for their answer. */
export const tellOfHold = task({ name: 'tell-of-hold', on: ['hold.placed'], payload: z.object({ subjectId: z.uuid() }), attempts: 12, run: ({ subjectId }) => mailHold(subjectId) })
