import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { SOURCE_KINDS, type SourceKind } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { ArrayMaxSize, IsArray, IsIn, IsNumber, Max, Min, ValidateIf, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';

const MAX_PULSE_WIDTHS = 64;
/** 100 fs to 1 s, in ns. */
export const PULSE_WIDTH_LIMITS_NS = { low: 1e-4, high: 1e9 } as const;
/** 1 Hz to 1 GHz, in kHz. */
export const FREQUENCY_LIMITS_KHZ = { low: 0.001, high: 1e6 } as const;
export const WAVELENGTH_LIMITS_NM = { low: 100, high: 20_000 } as const;

export class FrequencyRangeDto {
  @ApiProperty({ description: 'Lowest pulse frequency, kHz' })
  @NumberBetween(FREQUENCY_LIMITS_KHZ.low, FREQUENCY_LIMITS_KHZ.high, { what: 'The lowest frequency', unit: 'kHz' })
  from: number;

  @ApiProperty({ description: 'Highest pulse frequency, kHz' })
  @NumberBetween(FREQUENCY_LIMITS_KHZ.low, FREQUENCY_LIMITS_KHZ.high, { what: 'The highest frequency', unit: 'kHz' })
  to: number;
}

export class PulseWidthRangeDto {
  @ApiProperty({ description: 'Shortest pulse width, ns' })
  @NumberBetween(PULSE_WIDTH_LIMITS_NS.low, PULSE_WIDTH_LIMITS_NS.high, { what: 'The shortest pulse width', unit: 'ns' })
  from: number;

  @ApiProperty({ description: 'Longest pulse width, ns' })
  @NumberBetween(PULSE_WIDTH_LIMITS_NS.low, PULSE_WIDTH_LIMITS_NS.high, { what: 'The longest pulse width', unit: 'ns' })
  to: number;
}

export class PulseEnergyLimitDto {
  @ApiProperty({
    type: Number,
    nullable: true,
    description: 'Pulse width that the limit belongs to, ns; null: the source has one fixed width',
  })
  @ValidateIf((limit: PulseEnergyLimitDto) => limit.pulseWidthNs !== null)
  @NumberBetween(PULSE_WIDTH_LIMITS_NS.low, PULSE_WIDTH_LIMITS_NS.high, { what: 'The pulse width', unit: 'ns' })
  pulseWidthNs: number | null;

  @ApiProperty({ description: 'Largest pulse energy at that width, mJ' })
  @NumberBetween(1e-6, 1e5, { what: 'The largest pulse energy', unit: 'mJ' })
  energyMj: number;
}

/** What the source and the scan head are. Counts for evidence: a change makes a new physical number. */
export class PhysicalProfileDto {
  @ApiProperty({ enum: SOURCE_KINDS, description: 'Kind of laser source' })
  @IsIn(SOURCE_KINDS, { message: 'Choose the kind of source from the list.' })
  sourceKind: SourceKind;

  @ApiProperty({ description: 'Wavelength, nm' })
  @NumberBetween(WAVELENGTH_LIMITS_NM.low, WAVELENGTH_LIMITS_NM.high, { what: 'The wavelength', unit: 'nm' })
  wavelengthNm: number;

  @ApiProperty({ description: 'Rated average power, W' })
  @NumberBetween(0.01, 20_000, { what: 'The rated power', unit: 'W' })
  ratedPowerW: number;

  @ApiPropertyOptional({ type: [PulseEnergyLimitDto], description: 'Largest pulse energy for each pulse width' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_PULSE_WIDTHS)
  @ValidateNested({ each: true })
  @Type(() => PulseEnergyLimitDto)
  maxPulseEnergyMj?: PulseEnergyLimitDto[];

  @ApiPropertyOptional({ description: 'Beam quality M², 1 or more' })
  @MayBeAbsent()
  @NumberBetween(1, 100, { what: 'M²' })
  m2?: number;

  @ApiPropertyOptional({ description: 'Beam diameter (1/e²) at the lens, mm' })
  @MayBeAbsent()
  @NumberBetween(0.1, 200, { what: 'The beam diameter at the lens', unit: 'mm' })
  beamDiameterMm?: number;

  @ApiPropertyOptional({ type: FrequencyRangeDto, description: 'Range of pulse frequencies' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => FrequencyRangeDto)
  frequencyRangeKhz?: FrequencyRangeDto;

  @ApiPropertyOptional({ type: PulseWidthRangeDto, description: 'Range of pulse widths where the source lets them be set' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => PulseWidthRangeDto)
  pulseWidthRangeNs?: PulseWidthRangeDto;

  @ApiPropertyOptional({ type: [Number], description: 'The only pulse widths that the source offers, ns' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_PULSE_WIDTHS)
  @IsNumber({ allowNaN: false, allowInfinity: false }, { each: true, message: 'Each pulse width must be a number of nanoseconds.' })
  @Min(PULSE_WIDTH_LIMITS_NS.low, { each: true, message: 'Each pulse width must be above zero.' })
  @Max(PULSE_WIDTH_LIMITS_NS.high, { each: true, message: 'A pulse width this long is no pulse.' })
  pulseWidthsNs?: number[];

  @ApiPropertyOptional({ description: 'Fastest marking speed of the scan head, mm/s' })
  @MayBeAbsent()
  @NumberBetween(0.01, 100_000, { what: 'The top speed', unit: 'mm/s' })
  topSpeedMmPerS?: number;

  @ApiPropertyOptional({ description: 'Speed of a jump with the beam off, mm/s' })
  @MayBeAbsent()
  @NumberBetween(0.01, 100_000, { what: 'The jump speed', unit: 'mm/s' })
  jumpSpeedMmPerS?: number;

  @ApiPropertyOptional({ description: 'Acceleration of the spot, mm/s²' })
  @MayBeAbsent()
  @NumberBetween(0.01, 1e9, { what: 'The acceleration', unit: 'mm/s²' })
  accelerationMmPerS2?: number;

  @ApiPropertyOptional({ description: 'Clear aperture of the scan head, mm' })
  @MayBeAbsent()
  @NumberBetween(0.1, 200, { what: 'The aperture', unit: 'mm' })
  apertureMm?: number;

  @ApiPropertyOptional({ description: 'Settling time after a jump, ms' })
  @MayBeAbsent()
  @NumberBetween(0, 1000, { what: 'The settling time', unit: 'ms' })
  jumpSettleMs?: number;

  @ApiPropertyOptional({ description: 'Laser-on delay, µs; may be negative' })
  @MayBeAbsent()
  @NumberBetween(-100_000, 100_000, { what: 'The laser-on delay', unit: 'µs' })
  laserOnDelayUs?: number;

  @ApiPropertyOptional({ description: 'Laser-off delay, µs' })
  @MayBeAbsent()
  @NumberBetween(-100_000, 100_000, { what: 'The laser-off delay', unit: 'µs' })
  laserOffDelayUs?: number;
}
