import * as z from 'zod'

/** States of a job; being on hold and money are flags beside it. */
export const jobStates = ['draft', 'placed', 'awaiting samples', 'in work', 'in review', 'reported', 'closed', 'cancelled'] as const
export const JobState = z.enum(jobStates)
export type JobState = z.infer<typeof JobState>

export const MoneyState = z.enum(['unpaid', 'paid', 'on account', 'part refunded', 'refunded'])
export type MoneyState = z.infer<typeof MoneyState>

export const TestState = z.enum(['waiting', 'ready', 'in run', 'recorded', 'accepted', 'reported', 'void'])
export type TestState = z.infer<typeof TestState>

export const SampleState = z.enum(['expected', 'received', 'in work', 'done', 'missing', 'void'])
export type SampleState = z.infer<typeof SampleState>

/** Where a step of the traveller is. */
export const StepState = z.enum(['to come', 'planned', 'started', 'done', 'void'])
export type StepState = z.infer<typeof StepState>

/** A run: open at the bench, recorded for review, then accepted or sent back; stopped when given up at the bench. */
export const RunState = z.enum(['open', 'recorded', 'accepted', 'sent back', 'stopped'])
export type RunState = z.infer<typeof RunState>

/** A report's revision: being made on the worker, current, superseded by the next, or withdrawn. */
export const ReportState = z.enum(['being made', 'current', 'superseded', 'withdrawn'])
export type ReportState = z.infer<typeof ReportState>

export const Role = z.enum(['client', 'technician', 'manager'])
export type Role = z.infer<typeof Role>

/** What an authorisation lets a person do with a method. */
export const Right = z.enum(['carry out', 'review', 'sign'])
export type Right = z.infer<typeof Right>

export const Currency = z.enum(['GBP', 'EUR', 'USD'])
export type Currency = z.infer<typeof Currency>
