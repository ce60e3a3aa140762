/**
 * What follows a deed whose success may take its own screen away: a sheet leaves when its run is recorded, and word of that can come
 * before the answer does. Callbacks given to `mutate` are then dropped; these are not. A refusal stays with the mutation, which shows it.
 */
export function after<T>(deed: Promise<T>, then: (answer: T) => void, always: () => void = () => undefined): void {
  void deed.then(then, () => undefined).finally(always)
}
