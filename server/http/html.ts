/** Text that is HTML already. */
export class Markup {
  constructor(readonly text: string) {}
}

type Part = string | number | Markup | readonly Markup[];

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** A template of HTML: whatever is put in is escaped unless it was made by this function. */
export function html(strings: TemplateStringsArray, ...parts: readonly Part[]): Markup {
  const rest = parts.map((part, index) => `${render(part)}${strings[index + 1] ?? ''}`);
  return new Markup(`${strings[0] ?? ''}${rest.join('')}`);
}

function render(part: Part): string {
  if (part instanceof Markup) return part.text;
  if (typeof part === 'object') return part.map(({ text }) => text).join('\n');
  return String(part).replace(/[&<>"']/g, (character) => ENTITIES[character] ?? '');
}
