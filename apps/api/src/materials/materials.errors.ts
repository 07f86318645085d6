import type { Caution } from '@proofplate/recipe-model';
import { ConflictError, NotFoundError } from '../common/errors/domain-error';

const NAMES = { material: 'material', finish: 'finish', effect: 'effect', group: 'group of materials', caution: 'caution' } as const;
export type CatalogueKind = keyof typeof NAMES;

export class NotInCatalogueError extends NotFoundError {
  constructor(kind: CatalogueKind) {
    super(`This ${NAMES[kind]} is not in the shop, or no longer. Go back to Materials.`);
  }
}

export class ArchivedError extends ConflictError {
  constructor(kind: CatalogueKind) {
    super(`The ${NAMES[kind]} is archived. Restore it first.`);
  }
}

/** A `never` caution applies: nothing is planned, drafted or run. Carries every such caution with its reason and source. */
export class ForbiddenByCautionError extends ConflictError {
  override readonly code = 'never-mark';
  override readonly title = 'This must not be marked';

  constructor(cautions: readonly Caution[], { isOfGroup = false }: { isOfGroup?: boolean } = {}) {
    const subjects = cautions.map(({ subject, source }) => `${subject} (${source})`).join(' ');
    const wayOut = isOfGroup
      ? 'It applies to a material of the group that this covers. Ask a lead to take that material out of the group, or ask the laser safety officer.'
      : 'Choose another material, or ask the laser safety officer.';
    super(`${subjects} ${wayOut}`, {
      cautions: cautions.map(({ id, subject, text, source }) => ({ id, subject, text, source })),
    });
  }
}

export class CautionLoosenedError extends ConflictError {
  override readonly code = 'caution-loosened';
  override readonly title = 'A caution only gets tighter';
}

/** A submitted revision covers the group: one material more would widen what was signed. */
export class GroupSignedError extends ConflictError {
  override readonly code = 'group-signed';
  override readonly title = 'The group is part of what was submitted';

  constructor(recipes: readonly { readonly id: string; readonly code: string; readonly title: string }[]) {
    const codes = recipes.map(({ code }) => code).join(', ');
    const covers = recipes.length === 1 ? 'covers' : 'cover';
    super(`${codes} ${covers} this group. Make another group with the material, and propose a change that covers it.`, { recipes });
  }
}
