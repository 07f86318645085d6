import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';

export const MAX_NAME_LENGTH = 80;
export const MAX_NOTES_LENGTH = 2000;
/** From short scan lenses to the long ones of large fields. */
export const FOCAL_LENGTH_LIMITS_MM = { low: 10, high: 2000 } as const;
export const FIELD_SIZE_LIMITS_MM = { low: 1, high: 3000 } as const;

export class CreateLensDto {
  @ApiProperty({ description: 'Name as people on the floor call the lens; unique in the shop', maxLength: MAX_NAME_LENGTH })
  @RequiredText(MAX_NAME_LENGTH, 'Give the lens a name, such as the one written on its rim.')
  name: string;

  @ApiProperty({ description: 'Focal length, mm' })
  @NumberBetween(FOCAL_LENGTH_LIMITS_MM.low, FOCAL_LENGTH_LIMITS_MM.high, { what: 'The focal length', unit: 'mm' })
  focalLengthMm: number;

  @ApiProperty({ description: 'Side of the square marking field, mm' })
  @NumberBetween(FIELD_SIZE_LIMITS_MM.low, FIELD_SIZE_LIMITS_MM.high, { what: 'The field size', unit: 'mm' })
  fieldSizeMm: number;

  @ApiPropertyOptional({ description: 'Anything worth knowing, such as coating or protective glass', maxLength: MAX_NOTES_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTES_LENGTH)
  notes?: string;
}
