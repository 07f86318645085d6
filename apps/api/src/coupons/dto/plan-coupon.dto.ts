import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { LEVEL_SPACING_LABELS, type LevelSpacing, PARAMETER_KEYS, type ParameterKey } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { ArrayMaxSize, ArrayUnique, IsArray, IsDefined, IsIn, IsInt, IsOptional, IsUUID, Max, Min, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import type { FillDrawnBy } from './coupon.dto';
import { LARGEST_TYPED_VALUE, TypedSettingDto } from './entered-setting.dto';
import { PARAMETER_KEY_ENUM } from './parameter-set.dto';

/** Letters A to Z mark the rows, and the plate’s geometry holds as many columns. */
export const MAX_LEVELS_ON_PLATE = 26;
const LARGEST_SEED = 2_147_483_647;
const MAX_TITLE_LENGTH = 160;
const MAX_LOT_LENGTH = 80;
const MAX_PLACE_LENGTH = 120;
const MAX_NOTES_LENGTH = 2000;
const MAX_CAUTIONS = 200;
const SPACINGS = Object.keys(LEVEL_SPACING_LABELS);
export const CELL_MM = { least: 1, most: 30, usual: 5 } as const;
export const GAP_MM = { least: 0.3, most: 10, usual: 1.2 } as const;

/** Which coupon it is: the five keys, the plate and its notes. */
export class CouponSubjectDto {
  @ApiPropertyOptional({ description: 'What the coupon is for, in the shop’s words', maxLength: MAX_TITLE_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_TITLE_LENGTH)
  title?: string;

  @ApiProperty({ format: 'uuid', description: 'Material' })
  @IsUUID('all', { message: 'Choose the material.' })
  materialId: string;

  @ApiProperty({ format: 'uuid', description: 'Finish' })
  @IsUUID('all', { message: 'Choose the finish.' })
  finishId: string;

  @ApiProperty({ format: 'uuid', description: 'Effect that is wanted' })
  @IsUUID('all', { message: 'Choose the effect that is wanted.' })
  effectId: string;

  @ApiProperty({ format: 'uuid', description: 'Machine' })
  @IsUUID('all', { message: 'Choose the machine.' })
  machineId: string;

  @ApiProperty({ format: 'uuid', description: 'Lens, one of the machine’s' })
  @IsUUID('all', { message: 'Choose the lens.' })
  lensId: string;

  @ApiPropertyOptional({ type: Number, nullable: true, description: 'Thickness of the plate, mm' })
  @IsOptional()
  @NumberBetween(0.001, 1000, { what: 'The thickness', unit: 'mm' })
  thicknessMm?: number | null;

  @ApiPropertyOptional({ description: 'Lot of the material', maxLength: MAX_LOT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_LOT_LENGTH)
  lot?: string;

  @ApiPropertyOptional({ description: 'Where the plate will be kept', maxLength: MAX_PLACE_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_PLACE_LENGTH)
  storedAt?: string;

  @ApiPropertyOptional({ description: 'Notes', maxLength: MAX_NOTES_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTES_LENGTH)
  notes?: string;

  @ApiPropertyOptional({ type: [String], description: 'Cautions that the planner has read and taken in' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_CAUTIONS)
  @ArrayUnique()
  @IsUUID('all', { each: true, message: 'This does not name a caution.' })
  acknowledgedCautionIds?: string[];
}

/** A factor in the panel’s unit. */
export class PlannedFactorDto {
  @ApiProperty({ ...PARAMETER_KEY_ENUM, description: 'The parameter that varies' })
  @IsIn([...PARAMETER_KEYS], { message: 'Choose what varies from the list.' })
  parameter: ParameterKey;

  @ApiProperty({ description: 'First level, in the panel’s unit' })
  @NumberBetween(-LARGEST_TYPED_VALUE, LARGEST_TYPED_VALUE, { what: 'The first level' })
  from: number;

  @ApiProperty({ description: 'Last level, in the panel’s unit' })
  @NumberBetween(-LARGEST_TYPED_VALUE, LARGEST_TYPED_VALUE, { what: 'The last level' })
  to: number;

  @ApiProperty({ description: 'How many levels', minimum: 1, maximum: MAX_LEVELS_ON_PLATE })
  @IsInt({ message: 'The number of levels must be a whole number.' })
  @Min(1, { message: 'A factor has at least one level.' })
  @Max(MAX_LEVELS_ON_PLATE, { message: `A plate has room for ${MAX_LEVELS_ON_PLATE} levels each way.` })
  count: number;

  @ApiProperty({ enum: SPACINGS, description: 'Equal steps or equal ratios' })
  @IsIn(SPACINGS, { message: 'Choose equal steps or equal ratios.' })
  spacing: LevelSpacing;
}

export class PlanCouponDto extends CouponSubjectDto {
  @ApiProperty({ type: PlannedFactorDto, description: 'What varies across the columns' })
  @IsDefined({ message: 'Choose what varies across the columns.' })
  @ValidateNested()
  @Type(() => PlannedFactorDto)
  columns: PlannedFactorDto;

  @ApiPropertyOptional({ type: PlannedFactorDto, description: 'What varies down the rows; absent: one row' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => PlannedFactorDto)
  rows?: PlannedFactorDto;

  @ApiProperty({ type: TypedSettingDto, description: 'The same in every cell; what varies may be left out of it' })
  @IsDefined()
  @ValidateNested()
  @Type(() => TypedSettingDto)
  base: TypedSettingDto;

  @ApiPropertyOptional({ type: TypedSettingDto, description: 'Setting of corner marks, letters and code' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => TypedSettingDto)
  labelStep?: TypedSettingDto;

  @ApiPropertyOptional({ type: Number, nullable: true, description: 'Seed of the random run order; null or absent: row by row' })
  @IsOptional()
  @IsInt({ message: 'The seed is a whole number.' })
  @Min(0, { message: 'The seed is 0 or more.' })
  @Max(LARGEST_SEED, { message: 'The seed is too large.' })
  runOrderSeed?: number | null;

  @ApiProperty({ description: 'Side of a cell, mm' })
  @NumberBetween(CELL_MM.least, CELL_MM.most, { what: 'The side of a cell', unit: 'mm' })
  cellMm: number;

  @ApiProperty({ description: 'Gap between cells, mm' })
  @NumberBetween(GAP_MM.least, GAP_MM.most, { what: 'The gap between cells', unit: 'mm' })
  gapMm: number;

  @ApiProperty({ enum: ['machine', 'artwork'], description: 'Who draws the fill lines' })
  @IsIn(['machine', 'artwork'], { message: 'Choose who draws the fill lines.' })
  fillDrawnBy: FillDrawnBy;

  @ApiPropertyOptional({
    type: Number,
    nullable: true,
    description: 'Dose from which cells are flagged, J/mm²; absent: the lowest dose that went wrong on this material before',
  })
  @IsOptional()
  @NumberBetween(1e-6, 1e6, { what: 'The dose to flag from', unit: 'J/mm²' })
  doseCautionJPerMm2?: number | null;
}
