import type { MarkStep, RevisionContent, TransferResult } from '@proofplate/recipe-model';
import { MAX_REASON_LENGTH } from './dto/create-recipe.dto';
import { type Focus, firstSetUpStep } from './first-content';
import type { RevisionRecord } from './stored-revision';

/** The content of the draft: the target's steps and first set-up step; what belongs to the part is taken over. */
export function transferredContent({ revision, recipe }: RevisionRecord, steps: MarkStep[], focus: Focus): RevisionContent {
  const { setUpSteps, limits, scope } = revision.content;
  const isOfLens = (text: string) => text.startsWith(`Lens ${recipe.lens.name} fitted`);
  return { steps, setUpSteps: [firstSetUpStep(focus), ...setUpSteps.filter(({ text }) => !isOfLens(text))], limits, scope };
}

/** Where the setting comes from and what it keeps, in words that are signed with it. */
export function transferReason({ revision, recipe }: RevisionRecord, { outcome, steps }: TransferResult): string {
  const from = `revision ${revision.number ?? ''} of ${recipe.code} on ${recipe.machine.name}, ${recipe.lens.name}`;
  if (outcome === 'equivalent') {
    const kept = [...new Set(steps.flatMap(({ proposal }) => proposal?.kept.map(({ label }) => label.toLowerCase()) ?? []))];
    return `Transferred from ${from}. Keeps ${listed(kept)}. To be proved on a coupon.`;
  }
  const why = [...new Set(steps.flatMap(({ reasons }) => reasons.map(({ text }) => text)))].join(' ');
  return `Not equivalent: what comes nearest to ${from}. ${why} To be proved on a coupon.`.slice(0, MAX_REASON_LENGTH);
}

function listed(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
