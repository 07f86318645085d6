import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { ArrayMaxSize, ArrayMinSize, IsArray, IsOptional, ValidateNested } from 'class-validator';
import { HasBegun, IsDay } from '../../common/decorators/is-day';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { PageOf, PageQuery } from '../../common/pagination/page';
import { FREQUENCY_LIMITS_KHZ, PULSE_WIDTH_LIMITS_NS, WAVELENGTH_LIMITS_NM } from './physical-profile.dto';

export const MIN_POINTS = 3;
const MAX_POINTS = 101;
const MAX_METER_LENGTH = 120;
const MAX_NOTES_LENGTH = 1000;

export class CalibrationPointDto {
  @ApiProperty({ description: 'Power as set on the panel, percent' })
  @NumberBetween(0, 100, { what: 'The percentage' })
  percent: number;

  @ApiProperty({ description: 'Average power that the meter read, W' })
  @NumberBetween(0, 20_000, { what: 'The reading', unit: 'W' })
  watts: number;
}

export class CreateCalibrationDto {
  @ApiProperty({ description: 'Day of the reading', format: 'date' })
  @IsDay()
  @HasBegun()
  measuredOn: string;

  @ApiProperty({ description: 'Meter and its number', maxLength: MAX_METER_LENGTH })
  @RequiredText(MAX_METER_LENGTH, 'Name the meter, such as its type and number.')
  meter: string;

  @ApiPropertyOptional({ type: String, nullable: true, format: 'date', description: 'Day on which the meter’s own calibration ends' })
  @IsOptional()
  @IsDay()
  meterDueOn?: string | null;

  @ApiProperty({ description: 'Wavelength that the meter was set to, nm' })
  @NumberBetween(WAVELENGTH_LIMITS_NM.low, WAVELENGTH_LIMITS_NM.high, { what: 'The wavelength', unit: 'nm' })
  wavelengthNm: number;

  @ApiPropertyOptional({ type: Number, nullable: true, description: 'Pulse frequency during the reading, kHz; absent: continuous' })
  @IsOptional()
  @NumberBetween(FREQUENCY_LIMITS_KHZ.low, FREQUENCY_LIMITS_KHZ.high, { what: 'The frequency', unit: 'kHz' })
  frequencyKhz?: number | null;

  @ApiPropertyOptional({ type: Number, nullable: true, description: 'Pulse width during the reading, ns' })
  @IsOptional()
  @NumberBetween(PULSE_WIDTH_LIMITS_NS.low, PULSE_WIDTH_LIMITS_NS.high, { what: 'The pulse width', unit: 'ns' })
  pulseWidthNs?: number | null;

  @ApiProperty({ type: [CalibrationPointDto], description: 'At least three readings; percent rises strictly, watts never fall' })
  @IsArray()
  @ArrayMinSize(MIN_POINTS, { message: `Enter at least ${MIN_POINTS} readings.` })
  @ArrayMaxSize(MAX_POINTS, { message: `Enter at most ${MAX_POINTS} readings.` })
  @ValidateNested({ each: true })
  @Type(() => CalibrationPointDto)
  points: CalibrationPointDto[];

  @ApiPropertyOptional({ description: 'Anything that matters for the reading', maxLength: MAX_NOTES_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTES_LENGTH)
  notes?: string;
}

export class CalibrationDto {
  @ApiProperty({ description: 'Id of the calibration', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Id of the machine', format: 'uuid' }) machineId: string;
  @ApiProperty({ description: 'Day of the reading', format: 'date' }) measuredOn: string;
  @ApiProperty({ description: 'Meter and its number' }) meter: string;
  @ApiProperty({ type: String, nullable: true, format: 'date', description: 'Day on which the meter’s own calibration ends' }) meterDueOn:
    | string
    | null;
  @ApiProperty({ description: 'Wavelength that the meter was set to, nm' }) wavelengthNm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Pulse frequency during the reading, kHz' }) frequencyKhz: number | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Pulse width during the reading, ns' }) pulseWidthNs: number | null;
  @ApiProperty({ type: [CalibrationPointDto], description: 'The readings, percent rising' }) points: CalibrationPointDto[];
  @ApiProperty({ description: 'Notes of the reading' }) notes: string;
  @ApiProperty({ description: 'When it was entered', format: 'date-time' }) createdAt: string;
  @ApiProperty({ description: 'Who entered it' }) createdByName: string;
}

export class CalibrationPageDto extends PageOf(CalibrationDto) {}

export class ListCalibrationsQuery extends PageQuery {}

export class CalibrationWattsQuery {
  @ApiProperty({ description: 'Power as set on the panel, percent' })
  @Type(() => Number)
  @NumberBetween(0, 100, { what: 'The percentage' })
  percent: number;
}

export class CalibrationWattsDto {
  @ApiProperty({ description: 'The percentage that was asked for' }) percent: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Average power, W; null: outside the measured range' }) watts: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why there is no number; null when there is one' }) reason: string | null;
  @ApiProperty({ type: String, nullable: true, description: 'How the number was worked out' }) method: string | null;
}
