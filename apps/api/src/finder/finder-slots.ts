import { matchesWords } from '@proofplate/recipe-model';

/** The slots of the sentence, in its order. */
export const SLOT_KEYS = ['machine', 'lens', 'material', 'finish', 'effect'] as const;
export type SlotKey = (typeof SLOT_KEYS)[number];
export type SlotChoice = Partial<Record<SlotKey, string>>;

/** An approved recipe as the sentence sees it. */
export type Candidate = {
  readonly recipeId: string;
  readonly code: string;
  readonly title: string;
  readonly revisionId: string;
  readonly revisionNumber: number;
  readonly keys: Readonly<Record<SlotKey, string>>;
  /** Its own material and those of the group that it covers. */
  readonly materialIds: readonly string[];
};

/** A thing of the shop that can stand in a slot. */
export type SlotItem = {
  readonly slot: SlotKey;
  readonly id: string;
  readonly name: string;
  readonly detail: string;
  /** Name and synonyms: what typed words are looked for in. */
  readonly searchText: string;
};

export type SlotOption = {
  readonly id: string;
  readonly name: string;
  readonly detail: string;
  /** Approved recipes with the other slots held. */
  readonly count: number;
  /** Why there are none; null where there are some. */
  readonly reason: string | null;
};

export type Slot = {
  readonly chosenId: string | null;
  /** Where every recipe that is left has the same. */
  readonly settledId: string | null;
  readonly fitCount: number;
  readonly options: readonly SlotOption[];
};

export type Sentence = { readonly slots: Readonly<Record<SlotKey, Slot>>; readonly matches: readonly Candidate[] };

/** Slots that a reason names first: what the part asks for before where it is done. */
const REASON_ORDER: readonly SlotKey[] = ['effect', 'finish', 'material', 'machine', 'lens'];
const REASONS: Readonly<Record<SlotKey, (name: string) => string>> = {
  machine: (name) => `not on ${name}`,
  lens: (name) => `not with ${name}`,
  material: (name) => `not on ${name}`,
  finish: (name) => `not with ${name}`,
  effect: (name) => `not for ${name}`,
};

/** Fills each slot with its options; the counts hold the other slots fixed. */
export function fillSlots(
  candidates: readonly Candidate[],
  items: readonly SlotItem[],
  { choice, words }: { choice: SlotChoice; words: string },
): Sentence {
  const named = namesById(items);
  const worded = candidates.filter((candidate) => matchesWords(words, labelOf(candidate, named)));
  const matches = worded.filter((candidate) => fits(candidate, choice));
  const slotOf = (slot: SlotKey): Slot => {
    const options = optionsOf(slot, { items, candidates, worded, choice, named });
    return {
      chosenId: choice[slot] ?? null,
      settledId: settledIn(slot, matches),
      fitCount: options.filter(({ count }) => count > 0).length,
      options,
    };
  };
  const slots = {
    machine: slotOf('machine'),
    lens: slotOf('lens'),
    material: slotOf('material'),
    finish: slotOf('finish'),
    effect: slotOf('effect'),
  };
  return { slots, matches };
}

/** True if the recipe has what every chosen slot asks for; one slot can be left out. */
export function fits(candidate: Candidate, choice: SlotChoice, except?: SlotKey): boolean {
  return SLOT_KEYS.every((slot) => {
    const wanted = choice[slot];
    if (wanted === undefined || slot === except) return true;
    return slot === 'material' ? candidate.materialIds.includes(wanted) : candidate.keys[slot] === wanted;
  });
}

type OptionContext = {
  items: readonly SlotItem[];
  candidates: readonly Candidate[];
  worded: readonly Candidate[];
  choice: SlotChoice;
  named: ReadonlyMap<string, SlotItem>;
};

function optionsOf(slot: SlotKey, { items, candidates, worded, choice, named }: OptionContext): SlotOption[] {
  const counts = countBy(slot, worded, choice);
  const anywhere = countBy(slot, candidates, {});
  const withoutOne = REASON_ORDER.filter((other) => other !== slot && choice[other] !== undefined).map((other) => {
    const { [other]: dropped, ...rest } = choice;
    return { other, name: named.get(dropped ?? '')?.name ?? '', counts: countBy(slot, worded, rest) };
  });
  const reasonFor = (id: string): string => {
    if (!anywhere.has(id)) return 'none yet';
    const blocking = withoutOne.find((one) => one.counts.has(id));
    return blocking === undefined ? 'not with these together' : REASONS[blocking.other](blocking.name);
  };
  return items
    .filter((item) => item.slot === slot)
    .map(({ id, name, detail }) => {
      const count = counts.get(id) ?? 0;
      return { id, name, detail, count, reason: count > 0 ? null : reasonFor(id) };
    })
    .sort((a, b) => Number(b.count > 0) - Number(a.count > 0) || a.name.localeCompare(b.name, 'en', { numeric: true }));
}

function countBy(slot: SlotKey, candidates: readonly Candidate[], choice: SlotChoice): Map<string, number> {
  const counts = new Map<string, number>();
  for (const candidate of candidates) {
    if (!fits(candidate, choice, slot)) continue;
    for (const id of slot === 'material' ? candidate.materialIds : [candidate.keys[slot]]) counts.set(id, (counts.get(id) ?? 0) + 1);
  }
  return counts;
}

function settledIn(slot: SlotKey, matches: readonly Candidate[]): string | null {
  const [first] = matches;
  if (first === undefined) return null;
  return matches.every(({ keys }) => keys[slot] === first.keys[slot]) ? first.keys[slot] : null;
}

/** The words that a recipe is found by. */
export function labelsBy(items: readonly SlotItem[]): (candidate: Candidate) => string {
  const named = namesById(items);
  return (candidate) => labelOf(candidate, named);
}

function namesById(items: readonly SlotItem[]): Map<string, SlotItem> {
  return new Map(items.map((item) => [item.id, item]));
}

function labelOf({ code, title, keys }: Candidate, named: ReadonlyMap<string, SlotItem>): string {
  return [code, title, ...SLOT_KEYS.map((slot) => named.get(keys[slot])?.searchText ?? '')].join(' ');
}
