const notText = ['checkbox', 'radio', 'button', 'submit', 'file', 'range']

/** Whether keys pressed there are text. A number grid marks its fields `data-keys="letters"`: a letter is never input there. */
export function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement) || target.dataset['keys'] === 'letters') return false
  if (target instanceof HTMLInputElement) return !notText.includes(target.type)
  return target.isContentEditable || target instanceof HTMLTextAreaElement || target instanceof HTMLSelectElement
}
