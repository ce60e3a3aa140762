/** Text that is already safe HTML. */
export class Html {
  readonly text: string

  constructor(text: string) {
    this.text = text
  }
}

type Part = Html | string | number | Part[]

/** A template for HTML: whatever is put into it is escaped, unless it was made by this template itself. */
export function html(strings: TemplateStringsArray, ...parts: Part[]): Html {
  return new Html(strings.map((text, index) => text + write(parts[index] ?? '')).join(''))
}

function write(part: Part): string {
  if (Array.isArray(part)) return part.map(write).join('')
  if (part instanceof Html) return part.text
  return String(part).replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`)
}
