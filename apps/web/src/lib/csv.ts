/** Characters with which a spreadsheet would begin a formula. */
const FORMULA_START = /^[=+\-@\t\r]/;

/** One table as CSV text (RFC 4180). A text that a spreadsheet would run as a formula gets an apostrophe before it. */
export function csvText(rows: readonly (readonly (string | number | null)[])[]): string {
  return `${rows.map((row) => row.map(cellText).join(',')).join('\r\n')}\r\n`;
}

function cellText(value: string | number | null): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  const safe = FORMULA_START.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
