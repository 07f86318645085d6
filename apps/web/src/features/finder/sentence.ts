import { type Choice, type FinderResult, SLOTS, type SlotKey } from './finder.api';

const KEPT = 'proofplate.machine-and-lens';

/** The sentence as the address says it. */
export function choiceFrom(params: URLSearchParams): Choice {
  const choice: Choice = {};
  for (const key of [...SLOTS, 'words', 'recipe'] as const) {
    const value = params.get(key);
    if (value !== null && value !== '') choice[key] = value;
  }
  return choice;
}

export function paramsOf(choice: Choice): URLSearchParams {
  const params = new URLSearchParams();
  for (const key of [...SLOTS, 'words', 'recipe'] as const) {
    const value = choice[key];
    if (value !== undefined && value !== '') params.set(key, value);
  }
  return params;
}

/** Machine and lens of the last use: whoever stands here stands at the same machine. Kept for each shop of its own. */
export function keptChoice(shopId: string): Choice {
  try {
    const stored: unknown = JSON.parse(localStorage.getItem(KEPT) ?? 'null');
    if (typeof stored !== 'object' || stored === null || !('shopId' in stored) || stored.shopId !== shopId) return {};
    return {
      ...('machine' in stored && typeof stored.machine === 'string' ? { machine: stored.machine } : {}),
      ...('lens' in stored && typeof stored.lens === 'string' ? { lens: stored.lens } : {}),
    };
  } catch {
    return {};
  }
}

export function keepChoice(shopId: string, { machine, lens }: Choice): void {
  try {
    localStorage.setItem(KEPT, JSON.stringify({ shopId, machine, lens }));
  } catch {
    // Without storage the sentence begins empty the next time.
  }
}

export function forgetChoice(): void {
  try {
    localStorage.removeItem(KEPT);
  } catch {
    // Nothing was kept.
  }
}

/** The part is named: from here on the sentence has an answer or none. */
export function isPartNamed({ material, words = '', recipe }: Choice): boolean {
  return material !== undefined || words !== '' || recipe !== undefined;
}

/** What stands in a slot: what was chosen, what the answer has, or the only thing that is left. */
export function shownInSlot(slot: SlotKey, choice: Choice, result: FinderResult | undefined): string | undefined {
  if (choice[slot] !== undefined) return choice[slot];
  if (result?.answer != null) return result.answer[slot].id;
  const isSettled = isPartNamed(choice) || slot === 'machine' || slot === 'lens';
  return isSettled ? (result?.slots[slot].settledId ?? undefined) : undefined;
}

/** "material, 3 fit"; with a choice that does not fit, how many others would. */
export function slotCaption(slot: SlotKey, fitCount: number, isFitting: boolean): string {
  if (fitCount === 0) return `${slot}, none fits`;
  if (!isFitting) return `${slot}, ${fitCount} ${fitCount === 1 ? 'other fits' : 'others fit'}`;
  return `${slot}, ${fitCount} ${fitCount === 1 ? 'fits' : 'fit'}`;
}

/** Names of materials, finishes and effects run on in the sentence; an abbreviation keeps its capitals. */
export function inSentence(slot: SlotKey, name: string): string {
  if (slot === 'machine' || slot === 'lens') return name;
  return /^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
}
