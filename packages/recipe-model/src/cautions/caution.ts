import type { SourceKind } from '../vocabulary/lists';
import type { MaterialFamily } from '../vocabulary/material-families';

export type CautionLevel = 'never' | 'care';
export const CAUTION_LEVEL_LABELS: Readonly<Record<CautionLevel, string>> = { never: 'Never', care: 'Take care' };

/** What a caution applies to: every condition that is given must hold; an empty one holds always. */
export type CautionScope = {
  families?: MaterialFamily[];
  materialIds?: string[];
  finishIds?: string[];
  sourceKinds?: SourceKind[];
  effectKeys?: string[];
  roundPart?: boolean;
};

/** A prompt beside a setting; it defers to the machine's manual and the laser safety officer and clears nothing. */
export type Caution = { id: string; level: CautionLevel; subject: string; text: string; source: string; appliesTo: CautionScope };

/** Stands above every list of cautions: they are prompts, not clearances. */
export const CAUTION_DEFERENCE =
  'These are prompts. The machine’s manual and the laser safety officer decide; ask them before you mark. Nothing here clears a material.';
