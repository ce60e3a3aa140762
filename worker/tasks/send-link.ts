import * as z from 'zod'
import { mailLink } from '../../server/services/mails/mail-link.ts'
import { task } from '../task.ts'

/** Mails the link of an invitation or a password reset. */
export const sendLink = task({ name: 'send-link', on: ['person.invited', 'person.reset-asked'], payload: z.object({ linkId: z.uuid() }), attempts: 8, run: ({ linkId }) => mailLink(linkId) })
