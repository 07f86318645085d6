const TAG_TABLE = 128;
const MOST_TAGS = 100;
const LONGEST_NAME = 80;

/** The name that an embedded ICC profile gives itself, for the record beside a converted photo. */
export function readProfileName(icc: Buffer): string | undefined {
  if (icc.length < TAG_TABLE + 4) return undefined;
  const count = Math.min(icc.readUInt32BE(TAG_TABLE), MOST_TAGS);
  for (let index = 0; index < count; index += 1) {
    const at = TAG_TABLE + 4 + index * 12;
    if (at + 12 > icc.length) return undefined;
    if (icc.toString('latin1', at, at + 4) !== 'desc') continue;
    const offset = icc.readUInt32BE(at + 4);
    return printable(describe(icc.subarray(offset, offset + icc.readUInt32BE(at + 8))));
  }
  return undefined;
}

/** Version 2 profiles keep the name as ASCII, version 4 as UTF-16 under a language. */
function describe(tag: Buffer): string {
  const kind = tag.toString('latin1', 0, 4);
  if (kind === 'desc' && tag.length >= 12) return tag.toString('latin1', 12, 12 + tag.readUInt32BE(8));
  if (kind !== 'mluc' || tag.length < 28) return '';
  const [length, offset] = [tag.readUInt32BE(20), tag.readUInt32BE(24)];
  const text = Buffer.from(tag.subarray(offset, offset + length - (length % 2)));
  return text.length % 2 === 0 ? text.swap16().toString('utf16le') : '';
}

function printable(name: string): string | undefined {
  // biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is taken out
  const text = name.replace(/[\u0000-\u001f\u007f-\u009f]/g, '').trim();
  return text === '' ? undefined : text.slice(0, LONGEST_NAME);
}
