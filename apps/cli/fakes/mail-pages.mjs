// Two pages: the list of letters and one letter. Everything from a letter is text, never markup.
const STYLE = `
  :root { color-scheme: light dark; font: 16px/1.5 system-ui, sans-serif; }
  body { max-width: 46rem; margin: 2rem auto; padding: 0 1rem; }
  ol { list-style: none; padding: 0; }
  li { border-top: 1px solid color-mix(in srgb, currentColor 20%, transparent); padding: .75rem 0; }
  pre { white-space: pre-wrap; overflow-wrap: anywhere; font: inherit; }
  .quiet { opacity: .75; font-size: .875rem; }
`;
const WEB_ADDRESS = /https?:\/\/[^\s<>"']+/g;

export function listPage(letters) {
  const items = letters.map(
    (letter) => `<li><a href="/letters/${asHtml(letter.id)}">${asHtml(letter.subject || '(no subject)')}</a>
      <div class="quiet">to ${asHtml(letter.to.join(', '))} · ${asHtml(letter.receivedAt)}</div></li>`,
  );
  const body = items.length > 0 ? `<ol>${items.join('')}</ol>` : '<p>No letters yet. They appear here as soon as Proofplate sends one.</p>';
  return page('Letters', `<h1>Letters</h1><p class="quiet">Nothing leaves this machine: every letter ends here.</p>${body}`);
}

export function letterPage(letter) {
  const heads = `from ${letter.from} · to ${letter.to.join(', ')} · ${letter.receivedAt}`;
  return page(
    letter.subject,
    `<p><a href="/">All letters</a></p><h1>${asHtml(letter.subject)}</h1><p class="quiet">${asHtml(heads)}</p><pre>${linked(letter.text)}</pre>`,
  );
}

function page(title, body) {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>${asHtml(title)}</title><style>${STYLE}</style></head><body>${body}</body></html>`;
}

function linked(text) {
  let from = 0;
  let html = '';
  for (const match of text.matchAll(WEB_ADDRESS)) {
    const address = asHtml(match[0]);
    html += `${asHtml(text.slice(from, match.index))}<a href="${address}" rel="noreferrer">${address}</a>`;
    from = match.index + match[0].length;
  }
  return html + asHtml(text.slice(from));
}

function asHtml(text) {
  const entities = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
  return text.replace(/[&<>"']/g, (character) => entities[character]);
}
