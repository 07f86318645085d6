import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { PANEL_UNITS, type PanelUnit } from '@proofplate/physics';
import { PARAMETER_KEYS, type ParameterKey } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { ArrayMaxSize, ArrayMinSize, IsArray, IsIn, IsNumber, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { RequiredText } from '../../common/decorators/trimmed-text.decorator';

export const MAX_LABEL_LENGTH = 40;
const MAX_CHOICES = 64;
/** Far beyond any panel; keeps every value exactly representable. */
const LARGEST_PANEL_VALUE = 1e9;
const UNIT_CODES = Object.keys(PANEL_UNITS);

export class PanelFieldDto {
  @ApiProperty({ enum: PARAMETER_KEYS, description: 'Parameter that the field sets' })
  @IsIn([...PARAMETER_KEYS], { message: 'Choose what the field sets from the list.' })
  parameter: ParameterKey;

  @ApiProperty({ description: 'Label exactly as the machine’s control shows it', maxLength: MAX_LABEL_LENGTH })
  @RequiredText(MAX_LABEL_LENGTH, 'Write the label as the machine shows it.')
  label: string;

  @ApiProperty({ enum: UNIT_CODES, description: 'Unit that the field shows' })
  @IsIn(UNIT_CODES, { message: 'Choose the unit that the field shows.' })
  unit: PanelUnit;

  @ApiPropertyOptional({ description: 'Smallest value that the field takes, in its unit' })
  @MayBeAbsent()
  @NumberBetween(-LARGEST_PANEL_VALUE, LARGEST_PANEL_VALUE, { what: 'The smallest value' })
  minimum?: number;

  @ApiPropertyOptional({ description: 'Largest value that the field takes, in its unit' })
  @MayBeAbsent()
  @NumberBetween(-LARGEST_PANEL_VALUE, LARGEST_PANEL_VALUE, { what: 'The largest value' })
  maximum?: number;

  @ApiPropertyOptional({ description: 'Smallest change that the field shows, counted from zero' })
  @MayBeAbsent()
  @NumberBetween(1e-9, LARGEST_PANEL_VALUE, { what: 'The step' })
  step?: number;

  @ApiPropertyOptional({ type: [Number], description: 'The only values that the field offers, where it is a list' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_CHOICES)
  @IsNumber({ allowNaN: false, allowInfinity: false }, { each: true, message: 'Each choice must be a number.' })
  choices?: number[];

  @ApiPropertyOptional({ description: 'Physical value at 0 % of a percentage counted from the minimum' })
  @MayBeAbsent()
  @NumberBetween(-LARGEST_PANEL_VALUE, LARGEST_PANEL_VALUE, { what: 'The value at 0 %' })
  rangeLow?: number;

  @ApiPropertyOptional({ description: 'Physical value at 100 %; for a field in watts the power at 100 %' })
  @MayBeAbsent()
  @NumberBetween(-LARGEST_PANEL_VALUE, LARGEST_PANEL_VALUE, { what: 'The value at 100 %' })
  rangeHigh?: number;
}

/** What the machine’s control shows. Doesn’t count for evidence: relabelling proves nothing anew. */
export class PanelDto {
  @ApiProperty({ type: [PanelFieldDto], description: 'The fields in the order of the panel' })
  @IsArray()
  @ArrayMinSize(1, { message: 'Add at least one field that the panel shows.' })
  @ArrayMaxSize(PARAMETER_KEYS.length)
  @ValidateNested({ each: true })
  @Type(() => PanelFieldDto)
  fields: PanelFieldDto[];
}
