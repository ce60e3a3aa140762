/** Whether `.build` was made from the sources as they are. */
export function isBuilt(): boolean
