import { ApiProperty } from '@nestjs/swagger';
import { PageOf } from '../../common/pagination/page';
import { CouponFacetValueDto } from '../../coupons/dto/list-coupons.query.dto';
import { EvidencePhotoDto } from './evidence.dto';
import { PowerShiftDto } from './power-shift.dto';
import { RecipeKeysDto } from './recipe-keys.dto';
import { RecipeRevisionDto, RevisionBriefDto } from './recipe-revision.dto';
import { RecipeScopeDto } from './scope.dto';

/** How a recipe stands as a whole. `due`: approved, but its review is overdue. */
export const RECIPE_STATES = ['approved', 'due', 'scheduled', 'in_review', 'draft', 'returned', 'withdrawn'] as const;
export type RecipeState = (typeof RECIPE_STATES)[number];
export const RECIPE_NEEDS = ['sign', 'review-due', 'returned', 'draft'] as const;
export type RecipeNeed = (typeof RECIPE_NEEDS)[number];

/** The plate and cell that stand for a recipe in lists. */
export class RecipeFaceDto {
  @ApiProperty({ description: 'Id of the coupon', format: 'uuid' }) couponId: string;
  @ApiProperty({ description: 'Code of the coupon' }) couponCode: string;
  @ApiProperty({ description: 'Id of the cell', format: 'uuid' }) cellId: string;
  @ApiProperty({ description: 'Address of the cell' }) address: string;
  @ApiProperty({ description: 'Row of the cell from 0' }) rowIndex: number;
  @ApiProperty({ description: 'Column of the cell from 0' }) columnIndex: number;
  @ApiProperty({ description: 'Rows of the plate' }) rows: number;
  @ApiProperty({ description: 'Columns of the plate' }) columns: number;
  @ApiProperty({ description: 'Side of a cell, mm' }) cellMm: number;
  @ApiProperty({ description: 'Gap between cells, mm' }) gapMm: number;
  @ApiProperty({ type: EvidencePhotoDto, nullable: true, description: 'Newest photo that is ready' }) photo: EvidencePhotoDto | null;
}

export class RecipeRunsDto {
  @ApiProperty({ description: 'Good parts' }) good: number;
  @ApiProperty({ description: 'Scrapped parts' }) scrap: number;
}

/** A recipe as a row of the list. */
export class RecipeSummaryDto extends RecipeKeysDto {
  @ApiProperty({ description: 'Id of the recipe', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Code that people read, such as R-0042' }) code: string;
  @ApiProperty({ description: 'Title' }) title: string;
  @ApiProperty({ enum: RECIPE_STATES, enumName: 'RecipeState', description: 'How it stands; due: approved with an overdue review' })
  state: RecipeState;
  @ApiProperty({ type: RevisionBriefDto, nullable: true, description: 'The approved revision' }) current: RevisionBriefDto | null;
  @ApiProperty({
    type: RevisionBriefDto,
    nullable: true,
    description: 'The revision under way beside it: scheduled, in review, draft or returned',
  })
  underWay: RevisionBriefDto | null;
  @ApiProperty({ description: 'true: a hold is on the recipe or its machine' }) isHeld: boolean;
  @ApiProperty({ type: PowerShiftDto, nullable: true, description: 'A later reading moved the watts by more than the policy allows' })
  checkDue: PowerShiftDto | null;
  @ApiProperty({ type: RecipeFaceDto, nullable: true, description: 'Plate and cell that stand for it' }) face: RecipeFaceDto | null;
  @ApiProperty({ type: RecipeRunsDto, description: 'Parts of finished production runs of the last 30 days' }) last30Days: RecipeRunsDto;
  @ApiProperty({ type: String, nullable: true, enum: [...RECIPE_NEEDS, null], description: 'What it needs from the caller; null: nothing' })
  needsYou: RecipeNeed | null;
  @ApiProperty({ type: [String], description: 'What the caller may do: propose-change, edit, withdraw' }) allowedActions: string[];
}

/** Each count holds the other choices and leaves out its own. */
export class RecipeFacetsDto {
  @ApiProperty({ type: [CouponFacetValueDto], description: 'States' }) states: CouponFacetValueDto[];
  @ApiProperty({ type: [CouponFacetValueDto], description: 'Materials' }) materials: CouponFacetValueDto[];
  @ApiProperty({ type: [CouponFacetValueDto], description: 'Effects' }) effects: CouponFacetValueDto[];
  @ApiProperty({ type: [CouponFacetValueDto], description: 'Machines' }) machines: CouponFacetValueDto[];
  @ApiProperty({ description: 'Recipes that fit all choices' }) matchCount: number;
  @ApiProperty({ description: 'Recipes of the shop' }) totalCount: number;
}

export class RecipePageDto extends PageOf(RecipeSummaryDto) {
  @ApiProperty({ type: RecipeFacetsDto, description: 'Counts for the choices' }) facets: RecipeFacetsDto;
}

export class RecipeHoldDto {
  @ApiProperty({ description: 'Id of the hold', format: 'uuid' }) id: string;
  @ApiProperty({ enum: ['recipe', 'machine'], description: 'What is held' }) subject: 'recipe' | 'machine';
  @ApiProperty({ description: 'Why' }) reason: string;
  @ApiProperty({ description: 'Who placed it' }) placedBy: string;
  @ApiProperty({ format: 'date-time', description: 'Since when' }) placedAt: string;
}

/** A recipe with its ladder. */
export class RecipeDto extends RecipeSummaryDto {
  @ApiProperty({ type: RecipeScopeDto, description: 'What it covers beyond the five keys' }) scope: RecipeScopeDto;
  @ApiProperty({ type: [RecipeHoldDto], description: 'Open holds; they come before everything else' }) holds: RecipeHoldDto[];
  @ApiProperty({ type: RecipeRevisionDto, nullable: true, description: 'The approved revision, whole' })
  currentRevision: RecipeRevisionDto | null;
  @ApiProperty({ type: [RevisionBriefDto], description: 'Every revision, drafts first, then newest first' }) revisions: RevisionBriefDto[];
  @ApiProperty({ format: 'date-time', description: 'When it was begun' }) createdAt: string;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
}
