import { ApiPropertyOptional } from '@nestjs/swagger';
import { FEATURE_KINDS, type FeatureKind } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { IsIn, IsUUID, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';

export const MAX_NOTES_LENGTH = 2000;
const MAX_SPECIFICATION_LENGTH = 400;
/** Ten metres: beyond any part under a scan head. */
const LARGEST_MM = 10_000;

/** A closed range; an end that is absent is open. */
export class RangeDto {
  @ApiPropertyOptional({ description: 'Smallest, mm; absent: no lower end' })
  @MayBeAbsent()
  @NumberBetween(0, LARGEST_MM, { what: 'The lower end', unit: 'mm' })
  from?: number;

  @ApiPropertyOptional({ description: 'Largest, mm; absent: no upper end' })
  @MayBeAbsent()
  @NumberBetween(0, LARGEST_MM, { what: 'The upper end', unit: 'mm' })
  to?: number;
}

/** What a recipe covers beyond its five keys; part of the signed content. */
export class RecipeScopeDto {
  @ApiPropertyOptional({ type: RangeDto, description: 'Thickness of the part, mm' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => RangeDto)
  thicknessMm?: RangeDto;

  @ApiPropertyOptional({ type: RangeDto, description: 'Diameter of a round part, mm' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => RangeDto)
  partDiameterMm?: RangeDto;

  @ApiPropertyOptional({ enum: FEATURE_KINDS, enumName: 'FeatureKind', description: 'Kind of feature; absent: any' })
  @MayBeAbsent()
  @IsIn(FEATURE_KINDS, { message: 'Choose the kind of feature from the list.' })
  featureKind?: FeatureKind;

  @ApiPropertyOptional({ type: RangeDto, description: 'Size of the feature, mm' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => RangeDto)
  featureSizeMm?: RangeDto;

  @ApiPropertyOptional({ description: 'Group of materials that the recipe covers besides its own', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'Choose a group of materials of the shop.' })
  materialGroupId?: string;

  @ApiPropertyOptional({ description: 'Customer’s specification that asks for it by name', maxLength: MAX_SPECIFICATION_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_SPECIFICATION_LENGTH)
  customerSpecification?: string;
}

/** Where the setting may be used, as the author states it. */
export class LimitsOfUseDto {
  @ApiPropertyOptional({ type: RangeDto, description: 'Thickness of the part, mm' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => RangeDto)
  thicknessMm?: RangeDto;

  @ApiPropertyOptional({ type: RangeDto, description: 'Diameter of a round part, mm' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => RangeDto)
  partDiameterMm?: RangeDto;

  @ApiPropertyOptional({ description: 'Limits in words', maxLength: MAX_NOTES_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTES_LENGTH)
  notes: string = '';
}
