import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { ArrayMaxSize, ArrayMinSize, IsArray, IsIn, IsUUID, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { EnterStepDto } from './mark-step.dto';
import { RecipeScopeDto } from './scope.dto';

export const MAX_TITLE_LENGTH = 160;
export const MAX_REASON_LENGTH = 2000;
export const MAX_STEPS = 20;
export const OTHER_ROUTES = ['earlier-experience', 'customer-given', 'transferred'] as const;
export type OtherRoute = (typeof OTHER_ROUTES)[number];

/** A recipe whose first setting does not come from a coupon of the shop. */
export class CreateRecipeDto {
  @ApiPropertyOptional({ description: 'Title; absent: made from material, finish and effect', maxLength: MAX_TITLE_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_TITLE_LENGTH)
  title?: string;

  @ApiProperty({ format: 'uuid', description: 'Material' })
  @IsUUID('all', { message: 'Choose a material of the shop.' })
  materialId: string;

  @ApiProperty({ format: 'uuid', description: 'Finish' })
  @IsUUID('all', { message: 'Choose a finish of the shop.' })
  finishId: string;

  @ApiProperty({ format: 'uuid', description: 'Effect' })
  @IsUUID('all', { message: 'Choose an effect of the shop.' })
  effectId: string;

  @ApiProperty({ format: 'uuid', description: 'Machine' })
  @IsUUID('all', { message: 'Choose a machine of the shop.' })
  machineId: string;

  @ApiProperty({ format: 'uuid', description: 'Lens that is used on the machine' })
  @IsUUID('all', { message: 'Choose a lens of the machine.' })
  lensId: string;

  @ApiProperty({ enum: OTHER_ROUTES, description: 'How the setting was come by' })
  @IsIn(OTHER_ROUTES, { message: 'Choose how the setting was come by. One from a coupon is drafted from its cell.' })
  route: OtherRoute;

  @ApiProperty({ description: 'Where the setting comes from', maxLength: MAX_REASON_LENGTH })
  @RequiredText(MAX_REASON_LENGTH, 'Say where the setting comes from.')
  reason: string;

  @ApiProperty({ type: [EnterStepDto], description: 'Mark steps in their order, in the panel’s units' })
  @IsArray()
  @ArrayMinSize(1, { message: 'Add at least one mark step.' })
  @ArrayMaxSize(MAX_STEPS)
  @ValidateNested({ each: true })
  @Type(() => EnterStepDto)
  steps: EnterStepDto[];

  @ApiPropertyOptional({ type: RecipeScopeDto, description: 'What it covers beyond the five keys' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => RecipeScopeDto)
  scope?: RecipeScopeDto;
}

export class RecipeFromCellDto {
  @ApiProperty({ format: 'uuid', description: 'Coupon, marked or later' })
  @IsUUID('all', { message: 'Choose a coupon of the shop.' })
  couponId: string;

  @ApiProperty({ format: 'uuid', description: 'Cell of that coupon' })
  @IsUUID('all', { message: 'Choose a cell of the coupon.' })
  cellId: string;

  @ApiPropertyOptional({ description: 'Title; absent: made from material, finish and effect', maxLength: MAX_TITLE_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_TITLE_LENGTH)
  title?: string;

  @ApiPropertyOptional({
    format: 'uuid',
    description: 'Recipe with the same material, finish, effect, machine and lens that gets the draft; absent: a new recipe',
  })
  @MayBeAbsent()
  @IsUUID('all', { message: 'Choose a recipe of the shop.' })
  recipeId?: string;
}

export class CreateDraftDto {
  @ApiPropertyOptional({
    format: 'uuid',
    description: 'Revision to copy; absent: the approved one, else the newest',
  })
  @MayBeAbsent()
  @IsUUID('all', { message: 'Choose a revision of this recipe.' })
  basedOnRevisionId?: string;

  @ApiPropertyOptional({ description: 'Reason for the change', maxLength: MAX_REASON_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_REASON_LENGTH)
  reason?: string;
}

export class UpdateRecipeDto {
  @ApiPropertyOptional({ description: 'Title', maxLength: MAX_TITLE_LENGTH })
  @MayBeAbsent()
  @RequiredText(MAX_TITLE_LENGTH, 'Give the recipe a title.')
  title?: string;

  @ApiPropertyOptional({
    type: RecipeScopeDto,
    description: 'What it covers; it is signed with the setting, so it changes here only while nothing was submitted',
  })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => RecipeScopeDto)
  scope?: RecipeScopeDto;
}
