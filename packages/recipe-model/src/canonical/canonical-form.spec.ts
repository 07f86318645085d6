import { createHash } from 'node:crypto';
import fc from 'fast-check';
import type { RevisionContent } from '../vocabulary/revision-content';
import { canonicalForm, NotCanonicalError } from './canonical-form';
import { contentHash, contentText } from './content-text';

/** IEEE 754 bits as 16 hexadecimal digits, as RFC 8785 appendix B writes them. */
function fromBits(hex: string): number {
  return new DataView(Uint8Array.from(hex.match(/../gu) ?? [], (byte) => Number.parseInt(byte, 16)).buffer).getFloat64(0);
}

describe('canonicalForm', () => {
  it('writes the example of RFC 8785, 3.2.2', () => {
    const input: unknown = JSON.parse(
      '{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],"string":"\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/","literals":[null,true,false]}',
    );
    expect(canonicalForm(input)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  it('sorts members as RFC 8785, 3.2.3 does: by UTF-16 code units', () => {
    const input = {
      '\u20ac': 'Euro Sign',
      '\r': 'Carriage Return',
      '\ufb33': 'Hebrew Letter Dalet With Dagesh',
      '1': 'One',
      '\ud83d\ude00': 'Emoji: Grinning Face',
      '\u0080': 'Control',
      '\u00f6': 'Latin Small Letter O With Diaeresis',
    };
    expect([...canonicalForm(input).matchAll(/:"([^"]+)"/gu)].map((match) => match[1])).toEqual([
      'Carriage Return',
      'One',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh',
    ]);
  });

  it.each([
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['8000000000000001', '-5e-324'],
    ['7fefffffffffffff', '1.7976931348623157e+308'],
    ['4340000000000000', '9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['44b52d02c7e14af7', '1.0000000000000001e+23'],
    ['444b1ae4d6e2ef4e', '999999999999999700000'],
    ['444b1ae4d6e2ef4f', '999999999999999900000'],
    ['444b1ae4d6e2ef50', '1e+21'],
    ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555553', '333333333.3333332'],
    ['41b3de4355555554', '333333333.33333325'],
    ['41b3de4355555555', '333333333.3333333'],
    ['41b3de4355555556', '333333333.3333334'],
    ['41b3de4355555557', '333333333.33333343'],
    ['becbf647612f3696', '-0.0000033333333333333333'],
    ['43143ff3c1cb0959', '1424953923781206.2'],
  ])('writes the number %s of RFC 8785, appendix B as %s', (bits, text) => {
    expect(canonicalForm(fromBits(bits))).toBe(text);
  });

  it.each([
    ['7fffffffffffffff', 'NaN'],
    ['7ff0000000000000', 'Infinity'],
    ['fff0000000000000', '-Infinity'],
  ])('refuses the number %s (%s) and says where it is', (bits, word) => {
    expect(() => canonicalForm({ steps: [{ speed: fromBits(bits) }] })).toThrow(
      new NotCanonicalError('$.steps[0].speed', `is ${word}, which is not a finite number`),
    );
  });

  it('refuses what JSON cannot carry', () => {
    expect(() => canonicalForm({ a: '\ud800' })).toThrow('lone surrogate');
    expect(() => canonicalForm({ '\udead': 1 })).toThrow('lone surrogate');
    expect(() => canonicalForm([undefined])).toThrow('$[0] is of type undefined');
    expect(() => canonicalForm({ at: new Date(0) })).toThrow('$.at is not a plain object');
    expect(() => canonicalForm(new Map())).toThrow('$ is not a plain object');
    expect(() => canonicalForm({ id: 1n })).toThrow('$.id is of type bigint');
    expect(() => canonicalForm({ run: () => 1 })).toThrow('$.run is of type function');
  });

  it('takes an undefined member as absent, as the wire does', () => {
    expect(canonicalForm({ b: 1, a: undefined })).toBe('{"b":1}');
  });

  it('is the same after any trip over the wire and in any order of members', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const text = canonicalForm(value);
        expect(canonicalForm(JSON.parse(text))).toBe(text);
        expect(canonicalForm(JSON.parse(JSON.stringify(value)))).toBe(text);
        expect(canonicalForm(reversed(value))).toBe(text);
      }),
    );
  });
});

describe('contentText and contentHash', () => {
  const content: RevisionContent = {
    steps: [
      {
        purpose: 'anneal',
        parameters: {
          values: { speedMmPerS: { entered: { value: 0.8, unit: 'm/s' }, physical: 800 } },
          fill: 'crossed',
          assist: 'none',
          power: { watts: null, reason: 'No power is set.' },
        },
        pauseAfterS: 0,
      },
    ],
    setUpSteps: [{ text: 'Protective glass clean', mustTick: true }],
    limits: { notes: '' },
    scope: {},
  };
  const sha256 = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex');

  it('carry the name of the format and what was entered', () => {
    expect(contentText(content)).toContain('"entered":{"unit":"m/s","value":0.8}');
    expect(contentText(content)).toContain('"format":"proofplate.revision.1"');
  });

  it('change with any value that is signed, also where the physical value stays', () => {
    const other = structuredClone(content);
    other.steps[0].parameters.values.speedMmPerS = { entered: { value: 800, unit: 'mm/s' }, physical: 800 };
    expect(contentHash(other, sha256)).not.toBe(contentHash(content, sha256));
    expect(contentHash({ ...content, materialId: 'x' }, sha256)).not.toBe(contentHash(content, sha256));
    expect(contentHash(structuredClone(content), sha256)).toBe(contentHash(content, sha256));
  });

  it('hand the digest of the caller through', async () => {
    await expect(contentHash(content, async (text) => text.length)).resolves.toBe(contentText(content).length);
  });
});

/** The same value with the members of every object in the opposite order. */
function reversed(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reversed);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([name, member]) => [name, reversed(member)]),
  );
}
