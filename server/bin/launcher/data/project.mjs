import path from 'node:path'
import { fileURLToPath } from 'node:url'

/** The folder of the checkout; every process of the project has it as its working directory. */
export const project = fileURLToPath(new URL('../../../..', import.meta.url)).replace(/\/$/, '')

export const dataFolder = path.join(project, '.data')
export const buildFolder = path.join(project, '.build')

export const inProject = (...parts) => path.join(project, ...parts)
export const inData = (...parts) => path.join(dataFolder, ...parts)
