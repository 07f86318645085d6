export type TextRow = { readonly line: number; readonly cells: readonly string[] };

/** Rows of a pasted table: tabs as a spreadsheet copies them, else semicolons or commas; fields may be quoted (RFC 4180). Blank rows are left out. */
export function rowsOfText(text: string): TextRow[] {
  const delimiter = delimiterOf(text);
  const rows: TextRow[] = [];
  let [cells, field, isQuoted, line, startLine] = [[] as string[], '', false, 1, 1];
  const endRow = () => {
    const row = [...cells, field].map((cell) => cell.trim());
    if (row.some((cell) => cell !== '')) rows.push({ line: startLine, cells: row });
    [cells, field, startLine] = [[], '', line];
  };
  const plain = text.replace(/^\uFEFF/u, '').replace(/\r\n?/gu, '\n');
  for (let at = 0; at < plain.length; at += 1) {
    const sign = plain[at] ?? '';
    if (sign === '\n') line += 1;
    if (isQuoted && sign === '"' && plain[at + 1] === '"') {
      field += '"';
      at += 1;
    } else if (sign === '"' && (isQuoted || field.trim() === '')) isQuoted = !isQuoted;
    else if (isQuoted) field += sign;
    else if (sign === delimiter) {
      cells.push(field);
      field = '';
    } else if (sign === '\n') endRow();
    else field += sign;
  }
  endRow();
  return rows;
}

/** By the headings: a decimal comma may stand in any row below them. Undefined: a single column. */
function delimiterOf(text: string): string | undefined {
  const heading = text.split(/\r?\n/u).find((row) => row.trim() !== '') ?? '';
  return ['\t', ';', ','].find((delimiter) => heading.includes(delimiter));
}
