const entities: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Text as it may stand anywhere in HTML. */
export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (letter) => entities[letter] ?? letter);
}

export function tableHtml(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const cell = (tag: 'td' | 'th') => (text: string) => `<${tag}>${escapeHtml(text)}</${tag}>`;
  const line = (cells: readonly string[], tag: 'td' | 'th') => `<tr>${cells.map(cell(tag)).join('')}</tr>`;
  const body = rows.map((row) => line(row, 'td')).join('\n');
  return `<table><thead>${line(head, 'th')}</thead><tbody>\n${body}\n</tbody></table>`;
}

/** Names and what they are, as a list of terms. */
export function termsHtml(pairs: readonly (readonly [name: string, value: string])[]): string {
  const items = pairs.map(([name, value]) => `<dt>${escapeHtml(name)}</dt><dd>${escapeHtml(value)}</dd>`);
  return `<dl>${items.join('\n')}</dl>`;
}

export function sectionHtml(title: string, ...parts: readonly string[]): string {
  return `<section><h2>${escapeHtml(title)}</h2>\n${parts.join('\n')}</section>`;
}
