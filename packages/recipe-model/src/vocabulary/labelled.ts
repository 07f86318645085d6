/** A closed list: code (stored) → words (shown). Every list of this folder has this shape, in the order in which people read it. */
export type Labels<Code extends string> = Readonly<Record<Code, string>>;

/** Codes of a list in their order, for choices and validation. */
export function codesOf<Code extends string>(labels: Labels<Code>): Code[] {
  // Object.keys is typed string[]; a closed list has no other keys than its codes.
  return Object.keys(labels) as Code[];
}

/** True if the text is a code of the list, for input that comes from outside. */
export function isCodeOf<Code extends string>(labels: Labels<Code>, code: unknown): code is Code {
  return typeof code === 'string' && Object.hasOwn(labels, code);
}
