import { ApiProperty, ApiPropertyOptional, PartialType } from '@nestjs/swagger';
import { COMPARISONS, type Comparison, MEASUREMENT_QUANTITIES, type MeasurementQuantity } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { ArrayMaxSize, IsArray, IsIn, IsString, MaxLength, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { PageOf } from '../../common/pagination/page';
import { MAX_NAME_LENGTH } from './material.dto';

const MAX_CRITERIA = 20;
const MAX_NOTES_LENGTH = 2000;
const LARGEST_LIMIT = 1e6;
const MAX_UNIT_LENGTH = 10;

export class CriterionDto {
  @ApiProperty({ enum: MEASUREMENT_QUANTITIES, description: 'What is measured' })
  @IsIn([...MEASUREMENT_QUANTITIES], { message: 'Choose what is measured from the list.' })
  quantity: MeasurementQuantity;

  @ApiProperty({ enum: COMPARISONS, description: 'How the measured value is compared' })
  @IsIn([...COMPARISONS], { message: 'Choose at least, at most or between.' })
  comparison: Comparison;

  @ApiProperty({ description: 'The limit; with "between" the lower one' })
  @NumberBetween(-LARGEST_LIMIT, LARGEST_LIMIT, { what: 'The limit' })
  value: number;

  @ApiPropertyOptional({ description: 'The upper limit of "between"' })
  @MayBeAbsent()
  @NumberBetween(-LARGEST_LIMIT, LARGEST_LIMIT, { what: 'The upper limit' })
  upper?: number;

  @ApiPropertyOptional({ description: 'Unit of the limit; it is fixed by the quantity and may be left out', maxLength: MAX_UNIT_LENGTH })
  @MayBeAbsent()
  @IsString()
  @MaxLength(MAX_UNIT_LENGTH)
  unit?: string;
}

export class CreateEffectDto {
  @ApiProperty({ description: 'Name of the effect; unique in the shop', maxLength: MAX_NAME_LENGTH })
  @RequiredText(MAX_NAME_LENGTH, 'Name the effect, such as dark anneal.')
  name: string;

  @ApiPropertyOptional({ type: [CriterionDto], description: 'What a mark must meet; recorded on a coupon before its inspection' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_CRITERIA)
  @ValidateNested({ each: true })
  @Type(() => CriterionDto)
  criteria?: CriterionDto[];

  @ApiPropertyOptional({ description: 'Where the criteria come from, and anything worth knowing', maxLength: MAX_NOTES_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTES_LENGTH)
  notes?: string;
}

/** Only what is given changes; a given list of criteria replaces the earlier one. */
export class UpdateEffectDto extends PartialType(CreateEffectDto) {}

export class StoredCriterionDto extends CriterionDto {
  @ApiProperty({ description: 'Unit of the limit; "1" is a pure number' })
  declare unit: string;
}

export class EffectDto {
  @ApiProperty({ description: 'Id of the effect', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Key that cautions refer to' }) key: string;
  @ApiProperty({ description: 'true: every shop starts with it' }) isShipped: boolean;
  @ApiProperty({ description: 'Name in the shop' }) name: string;
  @ApiProperty({ type: [StoredCriterionDto], description: 'What a mark must meet' }) criteria: StoredCriterionDto[];
  @ApiProperty({ description: 'Where the criteria come from, and notes' }) notes: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was archived; null: in use' })
  archivedAt: string | null;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: edit, archive, restore' }) allowedActions: string[];
}

export class EffectPageDto extends PageOf(EffectDto) {}
