import {
  type LimitsOfUse,
  type MarkStep,
  type RecipeScope,
  type RevisionContent,
  type SetUpStep,
  type StepPurpose,
  showNumber,
} from '@proofplate/recipe-model';

/** What the set-up step needs to know of a lens on its machine. */
export type Focus = { readonly lensName: string; readonly workingDistanceMm: number | null; readonly focusMethod: string };

const PURPOSES: Readonly<Record<string, StepPurpose>> = {
  'dark-anneal': 'anneal',
  'colour-anneal': 'anneal',
  'shallow-engrave': 'engrave',
  'deep-engrave': 'engrave',
  'dye-bleaching': 'bleach',
  'coating-removal': 'remove-coating',
  frost: 'frost',
  polish: 'polish',
  'cut-mark': 'cut',
};

/** What a single step is for, by the effect that is wanted. */
export const purposeOf = (effectKey: string): StepPurpose => PURPOSES[effectKey] ?? 'fill';

/** The set-up step that every recipe begins with. */
export function firstSetUpStep({ lensName, workingDistanceMm, focusMethod }: Focus): SetUpStep {
  const method = focusMethod.trim();
  const focus =
    workingDistanceMm === null
      ? `focus found${method === '' ? '' : `: ${method}`}`
      : `focus at ${showNumber(workingDistanceMm)} mm${method === '' ? '' : `, ${method}`}`;
  return { text: `Lens ${lensName} fitted, protective glass clean, extraction on, ${focus}.`, mustTick: true };
}

/** The content of a recipe's first draft. The cells of a coupon are filled areas, so that is what it covers until somebody says otherwise. */
export function firstContent(steps: MarkStep[], focus: Focus, scope: RecipeScope = {}): RevisionContent {
  const limits: LimitsOfUse = { notes: '' };
  return { steps, setUpSteps: [firstSetUpStep(focus)], limits, scope: { featureKind: 'filled-area', ...scope } };
}
