import {
  type EnteredPart,
  type PartLength,
  type PartOpticsFacts,
  type PartResults,
  partGround,
  partResults,
  partSetUp,
} from '@proofplate/recipe-model';
import { type PartMessages, readTypedPart, type TypedPart } from './typed-part';

export type WorkedPart = {
  readonly part: EnteredPart;
  /** Null while something is empty, cannot be read or cannot be. */
  readonly results: PartResults | null;
  readonly messages: PartMessages;
  readonly missing: readonly PartLength[];
};

/** The part as it stands in the fields, worked out by the function that the server uses too. */
export function workPart(typed: TypedPart, facts: PartOpticsFacts, locale: string): WorkedPart {
  const { part, messages, missing } = readTypedPart(typed, locale);
  if (missing.length > 0 || Object.keys(messages).length > 0) return { part, results: null, messages, missing };
  const setUp = partSetUp(part, partGround(facts));
  if (setUp.kind === 'worked out') return { part, results: partResults(setUp), messages, missing };
  return { part, results: null, messages: Object.fromEntries(setUp.problems.map(({ field, detail }) => [field, detail])), missing };
}
