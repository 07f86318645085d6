import { ApiProperty } from '@nestjs/swagger';

/** What the craters of a coupon gave when they became a measured spot. */
export class SpotFitDto {
  @ApiProperty({ description: 'Craters in the line' }) pointCount: number;
  @ApiProperty({ type: [String], description: 'Cells of these craters' }) cells: string[];
  @ApiProperty({ description: 'Pulses on each place' }) pulses: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Pulse width, ns; null: the one that the source has' })
  pulseWidthNs: number | null;
  @ApiProperty({ description: 'Threshold as pulse energy, µJ' }) thresholdEnergyUj: number;
  @ApiProperty({ description: 'Its standard error, µJ' }) thresholdEnergyStandardErrorUj: number;
  @ApiProperty({ description: 'Threshold as peak fluence, J/cm²' }) thresholdPeakFluenceJPerCm2: number;
  @ApiProperty({ description: 'Its standard error, J/cm²' }) thresholdPeakFluenceStandardErrorJPerCm2: number;
}

export class SpotCouponDto {
  @ApiProperty({ description: 'Id of the coupon', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Its code' }) code: string;
}

export class SpotMeasurementDto {
  @ApiProperty({ description: 'Id of the measurement', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Spot diameter (1/e²) in focus, µm' }) spotUm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Standard error from the scatter of the craters, µm; null: not stated' })
  standardErrorUm: number | null;
  @ApiProperty({ description: 'How it was measured' }) method: string;
  @ApiProperty({ format: 'date', description: 'Day of the measurement' }) measuredOn: string;
  @ApiProperty({ type: SpotCouponDto, nullable: true, description: 'Coupon whose craters it comes from; null: typed' })
  coupon: SpotCouponDto | null;
  @ApiProperty({ type: SpotFitDto, nullable: true, description: 'What these craters gave; null: typed' }) fit: SpotFitDto | null;
  @ApiProperty({ description: 'true: the machine uses this one with the lens now' }) isInUse: boolean;
  @ApiProperty({ format: 'date-time', description: 'When it was entered' }) createdAt: string;
  @ApiProperty({ description: 'Who entered it' }) createdByName: string;
}

export class SpotMeasurementListDto {
  @ApiProperty({ type: [SpotMeasurementDto], description: 'Every spot that was entered, newest first' }) items: SpotMeasurementDto[];
  @ApiProperty({ type: String, nullable: true, description: 'Always null: the list is whole' }) nextCursor: string | null;
}
