import { makeHouse } from './make-house.ts'

/** Fills an empty database with the demonstration company and its work; does nothing where there is a company already. */
export async function makeDemo(): Promise<void> {
  await makeHouse()
}
