/** Markup that is safe to put into a page: made only by `html`, which escapes whatever it is given. */
export class Html {
  readonly markup: string;
  constructor(markup: string) {
    this.markup = markup;
  }
}

type Piece = string | number | Html | readonly Html[];

/** Template for markup: strings and numbers are escaped, other markup is put in as it is. */
export function html(literals: TemplateStringsArray, ...pieces: Piece[]): Html {
  const markup = literals.map((literal, place) => {
    const piece = pieces[place];
    return piece === undefined ? literal : literal + markupOf(piece);
  });
  return new Html(markup.join(''));
}

export const nothing = new Html('');

function markupOf(piece: Piece): string {
  if (piece instanceof Html) return piece.markup;
  if (typeof piece === 'object') return piece.map((part) => part.markup).join('');
  return String(piece).replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}

const address = /https?:\/\/[^\s<>"']+[^\s<>"'.,;:!?)\]]/g;

/** A text as it was typed, with its web addresses to follow; line ends are left to the style sheet. */
export function linkAddresses(text: string): Html {
  const parts: Html[] = [];
  let from = 0;
  for (const match of text.matchAll(address)) {
    parts.push(html`${text.slice(from, match.index)}<a href="${match[0]}">${match[0]}</a>`);
    from = match.index + match[0].length;
  }
  parts.push(html`${text.slice(from)}`);
  return html`${parts}`;
}
