import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { MEASUREMENT_METHODS, MEASUREMENT_QUANTITIES, type MeasurementMethod, type MeasurementQuantity } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { ArrayMaxSize, ArrayMinSize, IsArray, IsIn, IsUUID, ValidateNested } from 'class-validator';
import { IsMoment } from '../../common/decorators/is-moment';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { MAX_CELLS_AT_ONCE } from './batch-limits';

export const ILLUMINANTS = ['D65', 'D50', 'A', 'C', 'F2', 'F11'] as const;
export const OBSERVERS = ['2°', '10°'] as const;
export const GEOMETRIES = ['45/0', '0/45', 'd/8 gloss included', 'd/8 gloss excluded'] as const;
/** Letters of a code grade, best first, as ISO/IEC 15415 pairs them with 4 … 0. */
export const CODE_GRADES = ['A', 'B', 'C', 'D', 'F'] as const;
const MAX_INSTRUMENT_LENGTH = 120;
const MAX_LIGHT_LENGTH = 60;
const MAX_REASON_LENGTH = 500;
const LARGEST_VALUE = 1e9;

/** Conditions without which a number of the method says nothing. */
export class MeasurementConditionsDto {
  @ApiPropertyOptional({ enum: ILLUMINANTS, description: 'Colorimeter: illuminant' })
  @MayBeAbsent()
  @IsIn([...ILLUMINANTS], { message: 'Choose the illuminant from the list.' })
  illuminant?: (typeof ILLUMINANTS)[number];

  @ApiPropertyOptional({ enum: OBSERVERS, description: 'Colorimeter: observer' })
  @MayBeAbsent()
  @IsIn([...OBSERVERS], { message: 'Choose the observer, 2° or 10°.' })
  observer?: (typeof OBSERVERS)[number];

  @ApiPropertyOptional({ enum: GEOMETRIES, description: 'Colorimeter: geometry of light and view' })
  @MayBeAbsent()
  @IsIn([...GEOMETRIES], { message: 'Choose the geometry from the list.' })
  geometry?: (typeof GEOMETRIES)[number];

  @ApiPropertyOptional({ description: 'Verifier: diameter of the aperture, mil (1/1000 inch)' })
  @MayBeAbsent()
  @NumberBetween(1, 100, { what: 'The aperture', unit: 'mil' })
  apertureMil?: number;

  @ApiPropertyOptional({ description: 'Verifier: wavelength or kind of light, such as 660 nm', maxLength: MAX_LIGHT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_LIGHT_LENGTH)
  light?: string;

  @ApiPropertyOptional({ description: 'Verifier: angle of the light over the surface, degrees' })
  @MayBeAbsent()
  @NumberBetween(0, 90, { what: 'The angle of the light', unit: '°' })
  angleDeg?: number;
}

export class NewMeasurementDto {
  @ApiProperty({ description: 'Cell', format: 'uuid' })
  @IsUUID('all', { message: 'This does not name a cell.' })
  cellId: string;

  @ApiProperty({ enum: MEASUREMENT_QUANTITIES, enumName: 'MeasurementQuantity', description: 'What was measured' })
  @IsIn([...MEASUREMENT_QUANTITIES], { message: 'Choose what was measured from the list.' })
  quantity: MeasurementQuantity;

  @ApiPropertyOptional({ type: Number, description: 'Value in the quantity’s unit; a code grade may be given by its letter instead' })
  @MayBeAbsent()
  @NumberBetween(-LARGEST_VALUE, LARGEST_VALUE, { what: 'The value' })
  value?: number;

  @ApiPropertyOptional({ enum: CODE_GRADES, description: 'Letter of a code grade' })
  @MayBeAbsent()
  @IsIn([...CODE_GRADES], { message: 'A code grade is A, B, C, D or F.' })
  grade?: (typeof CODE_GRADES)[number];

  @ApiPropertyOptional({ description: 'Unit; it is fixed by the quantity and may be left out' })
  @MayBeAbsent()
  @TrimmedText(MAX_LIGHT_LENGTH)
  unit?: string;

  @ApiProperty({ enum: MEASUREMENT_METHODS, enumName: 'MeasurementMethod', description: 'How it was measured' })
  @IsIn([...MEASUREMENT_METHODS], { message: 'Choose how it was measured from the list.' })
  method: MeasurementMethod;

  @ApiPropertyOptional({ type: MeasurementConditionsDto, description: 'Conditions of the method' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => MeasurementConditionsDto)
  methodDetail?: MeasurementConditionsDto;

  @ApiPropertyOptional({ description: 'Instrument, as the shop calls it', maxLength: MAX_INSTRUMENT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_INSTRUMENT_LENGTH)
  instrument?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Photo of this coupon that it was read from' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a photo.' })
  photoId?: string;

  @ApiPropertyOptional({ type: Number, description: 'Standard uncertainty in the same unit' })
  @MayBeAbsent()
  @NumberBetween(0, LARGEST_VALUE, { what: 'The uncertainty' })
  uncertainty?: number;

  @ApiPropertyOptional({ format: 'date-time', description: 'When it was measured; absent: now' })
  @MayBeAbsent()
  @IsMoment()
  measuredAt?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Earlier measurement of the same cell and quantity that this takes the place of' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a measurement.' })
  supersedesId?: string;

  @ApiPropertyOptional({ description: 'Why it takes the place of the earlier one', maxLength: MAX_REASON_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_REASON_LENGTH)
  reason?: string;
}

export class AddMeasurementsDto {
  @ApiProperty({ type: [NewMeasurementDto], minItems: 1, maxItems: MAX_CELLS_AT_ONCE, description: 'Measurements, all or none' })
  @IsArray()
  @ArrayMinSize(1, { message: 'Enter at least one measurement.' })
  @ArrayMaxSize(MAX_CELLS_AT_ONCE, { message: `Send at most ${MAX_CELLS_AT_ONCE} measurements at once.` })
  @ValidateNested({ each: true })
  @Type(() => NewMeasurementDto)
  measurements: NewMeasurementDto[];
}
