/** A mail before it is dressed: the same words make the text and the HTML part. */
export type Letter = {
  readonly subject: string;
  readonly paragraphs: readonly string[];
  readonly action?: { readonly label: string; readonly url: string };
  /** Small print below the action. */
  readonly footnote?: string;
};

export type WrittenMail = { readonly subject: string; readonly text: string; readonly html: string };

const LONGEST_LINE = 200;
const SIGNATURE = 'Proofplate, the recipe library of your marking shop';

export function writeMail(letter: Letter): WrittenMail {
  return { subject: oneLine(letter.subject), text: asText(letter), html: asHtml(letter) };
}

/** One printable line: whatever a person typed as a name or title cannot start another header field. */
export function oneLine(text: string): string {
  return text
    .replace(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]+/gu, ' ')
    .replace(/ {2,}/g, ' ')
    .trim()
    .slice(0, LONGEST_LINE);
}

export function escapeHtml(text: string): string {
  const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
  return text.replace(/[&<>"']/g, (character) => entities[character] ?? character);
}

function asText({ paragraphs, action, footnote }: Letter): string {
  const blocks = [...paragraphs, ...(action ? [`${action.label}:\n${action.url}`] : []), ...(footnote ? [footnote] : [])];
  return `${blocks.join('\n\n')}\n\n-- \n${SIGNATURE}\n`;
}

function asHtml({ subject, paragraphs, action, footnote }: Letter): string {
  const paragraph = (text: string, style = '') => `<p style="margin:0 0 16px;${style}">${escapeHtml(text).replaceAll('\n', '<br>')}</p>`;
  const button = action
    ? `<p style="margin:0 0 16px"><a href="${escapeHtml(action.url)}">${escapeHtml(action.label)}</a></p>${paragraph(action.url, 'color:#555')}`
    : '';
  const small = [footnote, SIGNATURE].filter((text) => text !== undefined).map((text) => paragraph(text, 'color:#555;font-size:14px'));
  return [
    '<!doctype html>',
    `<html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(oneLine(subject))}</title></head>`,
    '<body style="margin:0;padding:24px;font:16px/1.5 sans-serif;color:#1b1b1b;background:#fff;max-width:640px">',
    ...paragraphs.map((text) => paragraph(text)),
    button,
    ...small,
    '</body></html>',
  ].join('\n');
}
