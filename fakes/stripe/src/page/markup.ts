/** HTML that is safe to put into other HTML. */
export class Markup {
  constructor(readonly html: string) {}
}

type Piece = string | number | Markup | null | false | readonly Piece[];

/** Template tag: everything put in is escaped unless it is markup already. `null` and `false` leave nothing. */
export function html(strings: TemplateStringsArray, ...pieces: Piece[]): Markup {
  return new Markup(strings.reduce((text, part, index) => text + render(pieces[index - 1] ?? null) + part));
}

function render(piece: Piece): string {
  if (piece === null || piece === false) return '';
  if (piece instanceof Markup) return piece.html;
  if (Array.isArray(piece)) return piece.map(render).join('');
  return String(piece).replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}
