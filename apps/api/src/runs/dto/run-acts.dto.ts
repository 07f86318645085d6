import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import {
  MEASUREMENT_METHODS,
  MEASUREMENT_QUANTITIES,
  type MeasurementMethod,
  type MeasurementQuantity,
  type Outcome,
} from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { ArrayMaxSize, IsArray, IsBoolean, IsIn, IsInt, IsUUID, Max, Min, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { BAD_OUTCOMES } from './run.dto';

const MAX_NOTE_LENGTH = 1000;
const MOST_PARTS = 1_000_000;
const MOST_MEASUREMENTS = 500;
const LARGEST_VALUE = 1e9;

function PartCount(what: string): PropertyDecorator {
  const message = `${what} must be a whole number from 0 to ${MOST_PARTS}.`;
  return (target, property) => {
    IsInt({ message })(target, property);
    Min(0, { message })(target, property);
    Max(MOST_PARTS, { message })(target, property);
  };
}

export class FirstPieceActDto {
  @ApiProperty({ description: 'true: it matches the mark to match, the batch is released' })
  @IsBoolean({ message: 'Say whether the first piece matches.' })
  ok: boolean;

  @ApiPropertyOptional({ description: 'Remark', maxLength: MAX_NOTE_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTE_LENGTH)
  note: string = '';

  @ApiPropertyOptional({ description: 'Photo of it', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a photo.' })
  photoId?: string;
}

export class MeasurePieceDto {
  @ApiProperty({ description: 'Number of the piece from 1' })
  @IsInt({ message: 'Number the pieces from 1.' })
  @Min(1, { message: 'Number the pieces from 1.' })
  @Max(MOST_PARTS)
  piece: number;

  @ApiProperty({ enum: MEASUREMENT_QUANTITIES, enumName: 'MeasurementQuantity', description: 'What was measured' })
  @IsIn(MEASUREMENT_QUANTITIES, { message: 'Choose what was measured.' })
  quantity: MeasurementQuantity;

  @ApiProperty({ description: 'Value in the quantity’s own unit' })
  @NumberBetween(-LARGEST_VALUE, LARGEST_VALUE, { what: 'The value' })
  value: number;

  @ApiProperty({ enum: MEASUREMENT_METHODS, enumName: 'MeasurementMethod', description: 'How' })
  @IsIn(MEASUREMENT_METHODS, { message: 'Choose how it was measured.' })
  method: MeasurementMethod;
}

export class FinishRunDto {
  @ApiProperty({ description: 'Good parts' })
  @PartCount('Good parts')
  good: number;

  @ApiProperty({ description: 'Scrapped parts' })
  @PartCount('Scrapped parts')
  scrap: number;

  @ApiPropertyOptional({ type: [MeasurePieceDto], description: 'Measurements by piece' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MOST_MEASUREMENTS)
  @ValidateNested({ each: true })
  @Type(() => MeasurePieceDto)
  measurements: MeasurePieceDto[] = [];

  @ApiPropertyOptional({ description: 'Notes', maxLength: MAX_NOTE_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTE_LENGTH)
  notes: string = '';
}

export class TellBadResultDto {
  @ApiProperty({ enum: BAD_OUTCOMES, enumName: 'BadOutcome', description: 'What went wrong' })
  @IsIn(BAD_OUTCOMES, { message: 'Choose what went wrong.' })
  outcome: Outcome;

  @ApiPropertyOptional({ description: 'Remark', maxLength: MAX_NOTE_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTE_LENGTH)
  note: string = '';
}
