import { Injectable } from '@nestjs/common';
import { RecipeRevisionsRepository } from './recipe-revisions.repository';
import { RecipesRepository } from './recipes.repository';
import { RevisionEvidenceRepository } from './revision-evidence.repository';

/** The three stores that a draft lies in. */
@Injectable()
export class DraftRepositories {
  constructor(
    readonly revisions: RecipeRevisionsRepository,
    readonly recipes: RecipesRepository,
    readonly evidence: RevisionEvidenceRepository,
  ) {}
}
