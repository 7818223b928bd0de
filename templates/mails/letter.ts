/** One mail as its reader gets it. */
export interface Letter {
  subject: string;
  text: string;
  html: string;
}

/** What a mail consists of, top to bottom; the same parts make the plain text and the HTML. */
export type Part =
  | { line: string }
  | { link: string; label: string }
  /** Rows of a small table; the last cell of each stands at the right. */
  | { rows: readonly (readonly string[])[] };

const maker = 'Coilyard';

/** @param name how the reader is greeted; left out where the yard does not know it */
export function letter(subject: string, name: string | null, parts: readonly Part[]): Letter {
  const greeting = name === null ? 'Good day,' : `Good day ${oneLine(name)},`;
  const all: Part[] = [{ line: greeting }, ...parts, { line: maker }];
  const body = all.map(asHtml).join('\n');
  return {
    subject: oneLine(subject),
    text: `${all.map(asText).join('\n\n')}\n`,
    html: `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><title>${escapeHtml(oneLine(subject))}</title></head>
<body>
${body}
</body>
</html>
`,
  };
}

function asText(part: Part): string {
  if ('line' in part) return part.line;
  if ('link' in part) return `${part.label}:\n${part.link}`;
  return part.rows.map((cells) => cells.join('   ')).join('\n');
}

function asHtml(part: Part): string {
  if ('line' in part) return `<p>${escapeHtml(part.line)}</p>`;
  // The address stands under its words as well, for readers whose program opens no links.
  if ('link' in part) {
    const address = escapeHtml(part.link);
    return `<p><a href="${address}">${escapeHtml(part.label)}</a><br>${address}</p>`;
  }
  const rows = part.rows.map(
    (cells) => `<tr>${cells.map((cell, at) => cellOf(cell, at === cells.length - 1)).join('')}</tr>`,
  );
  return `<table cellpadding="4" role="presentation">${rows.join('')}</table>`;
}

const cellOf = (cell: string, isLast: boolean) => `<td${isLast ? ' align="right"' : ''}>${escapeHtml(cell)}</td>`;

/** Names and subjects stand in headers too: a line break in one would begin another header. */
export const oneLine = (text: string): string => text.replace(/[\p{Cc}\p{Cf}\u2028\u2029]+/gu, ' ').trim();

const signs: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (sign) => signs[sign] ?? sign);
