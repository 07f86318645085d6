import { ApiProperty } from '@nestjs/swagger';
import { NumberBetween } from '../../common/decorators/number-between.decorator';

export const SPOT_LIMITS_UM = { low: 0.5, high: 5000 } as const;

export class CraterSeriesDto {
  @ApiProperty({ description: 'Pulses on each place' }) pulses: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Pulse width, ns; null: the one that the source has' })
  pulseWidthNs: number | null;
  @ApiProperty({ description: 'Focus offset, mm' }) focusOffsetMm: number;
}

export class CraterPointDto {
  @ApiProperty({ description: 'Address of the cell' }) address: string;
  @ApiProperty({ description: 'Crater diameter that counts, µm' }) diameterUm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Pulse energy, µJ; null: see excludedBecause' }) pulseEnergyUj: number | null;
  @ApiProperty({ type: CraterSeriesDto, nullable: true, description: 'What craters of one line share; null: not known' })
  series: CraterSeriesDto | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why the line does not take it; null: it does' }) excludedBecause:
    | string
    | null;
  @ApiProperty({ description: 'true: more than ten thresholds, so more than the spot may widen it' }) isFarAbove: boolean;
}

/** D² over ln E, with E in µJ and D in µm; spot and threshold with standard errors from the scatter. */
export class CraterLineDto {
  @ApiProperty({ description: 'Radius of the spot (1/e²), µm' }) spotRadiusUm: number;
  @ApiProperty({ description: 'Its standard error, µm' }) spotRadiusStandardErrorUm: number;
  @ApiProperty({ description: 'Threshold as pulse energy, µJ' }) thresholdEnergyUj: number;
  @ApiProperty({ description: 'Its standard error, µJ' }) thresholdEnergyStandardErrorUj: number;
  @ApiProperty({ description: 'Threshold as peak fluence, J/cm²' }) thresholdPeakFluenceJPerCm2: number;
  @ApiProperty({ description: 'Its standard error, J/cm²' }) thresholdPeakFluenceStandardErrorJPerCm2: number;
  @ApiProperty({ description: 'Slope, µm²' }) slopeUm2: number;
  @ApiProperty({ description: 'Its standard error, µm²' }) slopeStandardErrorUm2: number;
  @ApiProperty({ description: 'D² at 1 µJ, µm²' }) interceptUm2: number;
  @ApiProperty({ description: 'Share of the variation that the line explains' }) rSquared: number;
}

export class SeriesThresholdDto {
  @ApiProperty({ description: 'Pulses on each place' }) pulses: number;
  @ApiProperty({ description: 'Craters in its line' }) points: number;
  @ApiProperty({ description: 'Threshold as peak fluence, J/cm²' }) thresholdPeakFluenceJPerCm2: number;
  @ApiProperty({ description: 'Its standard error, J/cm²' }) standardErrorJPerCm2: number;
}

export class CraterIncubationDto {
  @ApiProperty({ description: 'Incubation coefficient S; 1: none' }) incubationCoefficient: number;
  @ApiProperty({ description: 'Threshold of a single pulse that it leads to, J/cm²' }) singlePulseThresholdJPerCm2: number;
  @ApiProperty({ type: [SeriesThresholdDto], description: 'Thresholds that it rests on, fewest pulses first' })
  thresholds: SeriesThresholdDto[];
}

export class CraterSpotDto {
  @ApiProperty({ description: 'Diameter of the spot (1/e²), to 0.01 µm' }) diameterUm: number;
  @ApiProperty({ description: 'Its standard error from the scatter, to 0.01 µm' }) standardErrorUm: number;
  @ApiProperty({ description: 'The method in words, as it would stand at the machine' }) method: string;
  @ApiProperty({ format: 'date', description: 'Day on which the last of its craters was measured' }) measuredOn: string;
}

export class CraterPlaceDto {
  @ApiProperty({ description: 'Machine that marked the coupon', format: 'uuid' }) machineId: string;
  @ApiProperty({ description: 'Its name' }) machineName: string;
  @ApiProperty({ description: 'Lens that it was marked with', format: 'uuid' }) lensId: string;
  @ApiProperty({ description: 'Its name' }) lensName: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Measured spot in use, µm; null: none' }) measuredSpotUm: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'How that one was measured' }) spotMethod: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date', description: 'Day of that measurement' }) spotMeasuredOn: string | null;
  @ApiProperty({ description: 'Number of the stored version of the lens on the machine; the ETag is "v" and this number' }) version: number;
}

/** Threshold and effective spot from the crater diameters of a coupon, worked out from what is stored at present. */
export class CraterFitDto {
  @ApiProperty({ description: 'Coupon', format: 'uuid' }) couponId: string;
  @ApiProperty({ type: [CraterPointDto], description: 'Every cell with a crater diameter, row by row' }) points: CraterPointDto[];
  @ApiProperty({ type: CraterSeriesDto, nullable: true, description: 'What the craters of the line share; null: none can be used' })
  series: CraterSeriesDto | null;
  @ApiProperty({ description: 'Craters in the line' }) pointCount: number;
  @ApiProperty({ type: CraterLineDto, nullable: true, description: 'The line; null: see refusedBecause' }) fit: CraterLineDto | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why there is no line' }) refusedBecause: string | null;
  @ApiProperty({ type: [String], description: 'What to look at before the numbers are trusted' }) remarks: string[];
  @ApiProperty({ type: CraterIncubationDto, nullable: true, description: 'From three numbers of pulses on; null before' })
  incubation: CraterIncubationDto | null;
  @ApiProperty({ type: CraterSpotDto, nullable: true, description: 'The spot that the line gives; null: no line' })
  spot: CraterSpotDto | null;
  @ApiProperty({ type: CraterPlaceDto, nullable: true, description: 'Machine and lens with the spot in use; null: the lens is not on it' })
  place: CraterPlaceDto | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why the spot cannot become the measured one; null: it can' })
  notSavableBecause: string | null;
  @ApiProperty({ description: 'Formula in words and symbols' }) formula: string;
  @ApiProperty({ description: 'Where the formula comes from' }) source: string;
  @ApiProperty({ type: [String], description: 'What the caller may do: save-spot' }) allowedActions: string[];
}

export class SaveCraterSpotDto {
  @ApiProperty({ description: 'Diameter that the caller was shown, µm; refused when the stored craters give another one by now' })
  @NumberBetween(SPOT_LIMITS_UM.low, SPOT_LIMITS_UM.high, { what: 'The spot', unit: 'µm' })
  shownSpotUm: number;
}
