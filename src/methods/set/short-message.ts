/** What a rule's message says of its row, without the row's own name and the reasons after the colon: "1.1 mm from reading 3". */
export function shortMessage(message: string): string {
  return (message.split(':')[0] ?? message).replace(/^(the )?(reading|field) \d+,? (lies )?/, '')
}
