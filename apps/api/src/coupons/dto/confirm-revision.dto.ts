import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { ArrayMaxSize, ArrayUnique, IsArray, IsInt, IsOptional, IsUUID, Max, Min, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { TypedSettingDto } from './entered-setting.dto';
import { CELL_MM, GAP_MM } from './plan-coupon.dto';

export const MOST_CONFIRMATION_CELLS = 60;
const MOST_STEPS = 50;
const MAX_SHORT_LENGTH = 120;
const MAX_NOTES_LENGTH = 2000;

/** A coupon of n equal cells that is to prove a draft. */
export class ConfirmRevisionDto {
  @ApiProperty({ format: 'uuid', description: 'Draft or revision in review that is to be proved' })
  @IsUUID('all', { message: 'Choose the draft that is to be proved.' })
  revisionId: string;

  @ApiProperty({ description: 'How many equal cells', minimum: 1, maximum: MOST_CONFIRMATION_CELLS })
  @IsInt({ message: 'The number of cells must be a whole number.' })
  @Min(1, { message: 'Mark at least one cell.' })
  @Max(MOST_CONFIRMATION_CELLS, { message: `Mark ${MOST_CONFIRMATION_CELLS} cells at most.` })
  count: number;

  @ApiPropertyOptional({ description: 'Which mark step the cells carry, from 1; absent: the first', minimum: 1 })
  @MayBeAbsent()
  @IsInt({ message: 'The step is a whole number.' })
  @Min(1, { message: 'Steps count from 1.' })
  @Max(MOST_STEPS, { message: 'There is no such step.' })
  stepNumber?: number;

  @ApiPropertyOptional({ description: 'Lot of the material; another lot proves more', maxLength: MAX_SHORT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_SHORT_LENGTH)
  lot?: string;

  @ApiPropertyOptional({ type: Number, nullable: true, description: 'Thickness of the plate, mm' })
  @IsOptional()
  @NumberBetween(0.001, 1000, { what: 'The thickness', unit: 'mm' })
  thicknessMm?: number | null;

  @ApiPropertyOptional({ description: 'Where the plate will be kept', maxLength: MAX_SHORT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_SHORT_LENGTH)
  storedAt?: string;

  @ApiPropertyOptional({ description: 'Notes', maxLength: MAX_NOTES_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTES_LENGTH)
  notes?: string;

  @ApiPropertyOptional({ description: `Side of a cell, mm; absent: ${CELL_MM.usual}` })
  @MayBeAbsent()
  @NumberBetween(CELL_MM.least, CELL_MM.most, { what: 'The side of a cell', unit: 'mm' })
  cellMm?: number;

  @ApiPropertyOptional({ description: `Gap between cells, mm; absent: ${GAP_MM.usual}` })
  @MayBeAbsent()
  @NumberBetween(GAP_MM.least, GAP_MM.most, { what: 'The gap between cells', unit: 'mm' })
  gapMm?: number;

  @ApiPropertyOptional({
    type: TypedSettingDto,
    description: 'Setting of corner marks, letters and code; absent: as on the coupon that the draft rests on, else on the latest alike',
  })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => TypedSettingDto)
  labelStep?: TypedSettingDto;

  @ApiPropertyOptional({ type: [String], description: 'Cautions that the planner has read and taken in' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(200)
  @ArrayUnique()
  @IsUUID('all', { each: true, message: 'This does not name a caution.' })
  acknowledgedCautionIds?: string[];
}
