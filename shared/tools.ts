import { convertHardness } from './hardness/convert-hardness.ts'
import type { Tool } from './method/define-tool.ts'
import { combineUncertaintyTool } from './tools/combine-uncertainty-tool.ts'
import { conformityTool } from './tools/conformity-tool.ts'
import { roundTool } from './tools/round-tool.ts'
import { summaryTool } from './tools/summary-tool.ts'
import { tQuantileTool } from './tools/t-quantile-tool.ts'

/** Every calculation that is no method. */
export const tools: readonly Tool[] = [convertHardness, roundTool, summaryTool, tQuantileTool, combineUncertaintyTool, conformityTool]
