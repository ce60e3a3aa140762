/** A word of the product at the beginning of a label: "carry out" is "Carry out". */
export function capital(word: string): string {
  return word.charAt(0).toUpperCase() + word.slice(1)
}
