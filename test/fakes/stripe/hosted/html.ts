/** Text that is already safe to stand in a page. */
export class Html {
  constructor(readonly text: string) {}
}

type Part = string | number | Html | Html[] | false | undefined;

/** Everything put into the template is escaped, except what this function made itself. */
export function html(pieces: TemplateStringsArray, ...parts: Part[]): Html {
  return new Html(pieces.map((piece, index) => piece + written(parts[index])).join(''));
}

function written(part: Part): string {
  if (part === undefined || part === false) return '';
  if (part instanceof Html) return part.text;
  if (Array.isArray(part)) return part.map((one) => one.text).join('');
  return String(part).replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}
