import { matchesWords, wordsOf } from '@proofplate/recipe-model';
import { type Candidate, SLOT_KEYS, type SlotChoice, type SlotKey } from './finder-slots';

/** What the order of near misses needs to know of the shop's materials. */
export type FamilyOf = (materialId: string) => string | undefined;

export type NearMiss = {
  readonly candidate: Candidate;
  readonly differs: readonly SlotKey[];
  /** Typed words that are not found in it. */
  readonly missingWords: readonly string[];
};

const MOST_NEAR_MISSES = 3;
/** The same mark elsewhere comes first, then another finish, another effect, and last another material of the family. */
const RANK: Readonly<Record<SlotKey, number>> = { machine: 0, lens: 0, finish: 1, effect: 2, material: 3 };
const FAR_RANK = 4;

/** The approved recipes that come nearest to what was asked for; a material of another family is never near. */
export function nearMisses(candidates: readonly Candidate[], choice: SlotChoice, familyOf: FamilyOf): NearMiss[] {
  return candidates
    .map((candidate) => ({ candidate, differs: differingSlots(candidate, choice), missingWords: [] }))
    .filter(({ candidate, differs }) => differs.length > 0 && isNear(candidate, differs, choice, familyOf))
    .sort(
      (a, b) =>
        rankOf(a) - rankOf(b) ||
        a.differs.length - b.differs.length ||
        a.candidate.code.localeCompare(b.candidate.code, 'en', { numeric: true }),
    )
    .slice(0, MOST_NEAR_MISSES);
}

/** The approved recipes that most of the typed words lead to, where no recipe has them all and no material was chosen. */
export function nearByWords(
  candidates: readonly Candidate[],
  { choice, words }: { choice: SlotChoice; words: string },
  labelOf: (candidate: Candidate) => string,
): NearMiss[] {
  const typed = wordsOf(words);
  return candidates
    .map((candidate) => {
      const label = labelOf(candidate);
      const missingWords = typed.filter((word) => !matchesWords(word, label));
      return { candidate, differs: differingSlots(candidate, choice), missingWords };
    })
    .filter(({ missingWords }) => missingWords.length < typed.length)
    .sort(
      (a, b) =>
        a.missingWords.length - b.missingWords.length ||
        a.differs.length - b.differs.length ||
        a.candidate.code.localeCompare(b.candidate.code, 'en', { numeric: true }),
    )
    .slice(0, MOST_NEAR_MISSES);
}

function differingSlots(candidate: Candidate, choice: SlotChoice): SlotKey[] {
  return SLOT_KEYS.filter((slot) => {
    const wanted = choice[slot];
    if (wanted === undefined) return false;
    return slot === 'material' ? !candidate.materialIds.includes(wanted) : candidate.keys[slot] !== wanted;
  });
}

function isNear(candidate: Candidate, differs: readonly SlotKey[], choice: SlotChoice, familyOf: FamilyOf): boolean {
  if (choice.material === undefined) return false;
  if (!differs.includes('material')) return true;
  // Another material helps only where it is for the same effect: two things apart are a guess.
  const family = familyOf(choice.material);
  return !differs.includes('effect') && family !== undefined && family === familyOf(candidate.keys.material);
}

function rankOf({ differs }: NearMiss): number {
  // Another effect somewhere else is further away than the same effect on another grade.
  if (differs.includes('effect') && differs.length > 1) return FAR_RANK;
  return Math.max(...differs.map((slot) => RANK[slot]));
}
