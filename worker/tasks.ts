import type { Task } from './task.ts'

/** Every task. Nothing is found by scanning folders. */
export const tasks: readonly Task[] = []
