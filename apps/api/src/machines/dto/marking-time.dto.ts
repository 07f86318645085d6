import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import type { HeadDelays, MarkTime } from '@proofplate/recipe-model';
import { IsBoolean, ValidateIf } from 'class-validator';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { RequiredText } from '../../common/decorators/trimmed-text.decorator';

export const FILLED = ['one direction', 'both directions', 'crossed'] as const;
const BASES = ['fitted', 'profile', 'not known'] as const;
/** From a tenth of a second to a week. */
export const CLOCK_LIMITS_S = { low: 0.1, high: 604_800 } as const;
export const AREA_LIMITS_MM = { low: 0.01, high: 5000 } as const;
const MAX_REASON_LENGTH = 300;

/** How one mark step scans, as its time needs it. */
export class TimedStepDto {
  @ApiProperty({ description: 'Line spacing, µm' }) lineSpacingUm: number;
  @ApiProperty({ description: 'Scan speed, mm/s' }) speedMmPerS: number;
  @ApiProperty({ description: 'Passes' }) passes: number;
  @ApiProperty({ enum: FILLED, description: 'How the area is scanned' }) fill: (typeof FILLED)[number];
}

export class MarkedAreaDto extends TimedStepDto {
  @ApiProperty({ description: 'Width along the lines, mm' }) widthMm: number;
  @ApiProperty({ description: 'Height across the lines, mm' }) heightMm: number;
  @ApiProperty({ description: 'How many of these rectangles were marked' }) count: number;
}

/** Overheads of the scan head that hold for a machine. What stands in it depends on the basis. */
export class HeadOverheadsDto {
  @ApiProperty({ enum: BASES, description: 'fitted from logged times, else of the profile, else not known' }) basis: (typeof BASES)[number];
  @ApiPropertyOptional({ description: 'Jump speed of the profile, mm/s' }) jumpSpeedMmPerS?: number;
  @ApiPropertyOptional({ description: 'fitted: logged times that it rests on' }) n?: number;
  @ApiPropertyOptional({ description: 'fitted: time per line, ms' }) lineMs?: number;
  @ApiPropertyOptional({ description: 'fitted: its standard error, ms' }) lineStandardErrorMs?: number;
  @ApiPropertyOptional({ type: Number, nullable: true, description: 'fitted: time per scan, ms; null: see scanMissingBecause' })
  scanMs?: number | null;
  @ApiPropertyOptional({ type: Number, nullable: true, description: 'fitted: its standard error, ms' }) scanStandardErrorMs?: number | null;
  @ApiPropertyOptional({ type: String, nullable: true, description: 'fitted: why the time per scan is not known' })
  scanMissingBecause?: string | null;
  @ApiPropertyOptional({ description: 'fitted: standard deviation of logged less predicted, s' }) spreadS?: number;
  @ApiPropertyOptional({ description: 'profile: why nothing is fitted' }) notFittedBecause?: string;
  @ApiPropertyOptional({ description: 'not known: why' }) because?: string;
}

/** What the machine’s profile says of the time beside the lines; absent: nothing. */
export class HeadDelaysDto implements HeadDelays {
  @ApiPropertyOptional({ description: 'Acceleration of the spot, mm/s²' }) accelerationMmPerS2?: number;
  @ApiPropertyOptional({ description: 'Laser-on delay, µs' }) laserOnDelayUs?: number;
  @ApiPropertyOptional({ description: 'Laser-off delay, µs' }) laserOffDelayUs?: number;
  @ApiPropertyOptional({ description: 'Settling time after a jump, ms' }) jumpSettleMs?: number;
}

export class TimeGroundDto {
  @ApiProperty({ type: HeadDelaysDto, description: 'Delays of the profile' }) physical: HeadDelaysDto;
  @ApiProperty({ type: HeadOverheadsDto, description: 'Overheads that hold' }) overheads: HeadOverheadsDto;
}

export class MarkTimeDto {
  @ApiProperty({ type: Number, nullable: true, description: 'Time, s; null: see missingBecause' }) totalS: MarkTime['totalS'];
  @ApiProperty({ type: Number, nullable: true, description: 'Of it with the beam on, s' }) beamOnS: MarkTime['beamOnS'];
  @ApiProperty({ type: Number, nullable: true, description: 'Standard error, s; null: the overheads are not fitted' })
  errorS: MarkTime['errorS'];
  @ApiProperty({ type: String, nullable: true, description: 'Why the time is not known' }) missingBecause: MarkTime['missingBecause'];
}

export class ReplacedTimeDto {
  @ApiProperty({ description: 'Time before the correction, s' }) seconds: number;
  @ApiProperty({ description: 'Who had logged it' }) loggedBy: string;
}

/** A mark that somebody clocked. */
export class LoggedTimeDto {
  @ApiProperty({ format: 'uuid', description: 'Id of the logged time' }) id: string;
  @ApiProperty({ type: String, nullable: true, description: 'Code of the run' }) runCode: string | null;
  @ApiProperty({ type: String, nullable: true, description: 'Code of the coupon' }) couponCode: string | null;
  @ApiProperty({ type: String, nullable: true, description: 'Address of the cell; null: a run, or the whole coupon' }) address:
    | string
    | null;
  @ApiProperty({ type: [MarkedAreaDto], description: 'What was marked' }) areas: MarkedAreaDto[];
  @ApiProperty({ description: 'Pauses between mark steps within the time, s' }) pausesS: number;
  @ApiProperty({ description: 'Clocked time, s' }) seconds: number;
  @ApiProperty({ description: 'false: somebody took it out of the count' }) counts: boolean;
  @ApiProperty({ description: 'Profile of the machine at that time' }) profileNumber: number;
  @ApiProperty({ description: 'false: the source or scan head changed since, and the time counts no longer' }) isOfPresentMachine: boolean;
  @ApiProperty({ description: 'Far from what the other logged times say of it; it counts all the same' }) isOutlier: boolean;
  @ApiProperty({ type: MarkTimeDto, description: 'What the overheads that hold now predict for it' }) predicted: MarkTimeDto;
  @ApiProperty({ type: ReplacedTimeDto, nullable: true, description: 'What this corrects' }) replaced: ReplacedTimeDto | null;
  @ApiProperty({ description: 'Why it was corrected or taken out; empty: it was not' }) reason: string;
  @ApiProperty({ description: 'Who logged it' }) loggedBy: string;
  @ApiProperty({ format: 'date-time', description: 'When it was logged' }) loggedAt: string;
}

export class MachineMarkingTimeDto {
  @ApiProperty({ type: TimeGroundDto, description: 'What times are worked out with' }) ground: TimeGroundDto;
  @ApiProperty({ type: [LoggedTimeDto], description: 'Logged times, newest first; at most 500' }) items: LoggedTimeDto[];
}

export class CorrectLoggedTimeDto {
  @ApiProperty({ description: 'true: the time is put right; false: it is taken out of the count' })
  @IsBoolean({ message: 'Say whether the time counts.' })
  counts: boolean;

  @ApiPropertyOptional({ description: 'The right time, s; only where it counts' })
  @ValidateIf((dto: CorrectLoggedTimeDto) => dto.counts)
  @NumberBetween(CLOCK_LIMITS_S.low, CLOCK_LIMITS_S.high, { what: 'The time', unit: 's' })
  seconds?: number;

  @ApiProperty({ description: 'What was wrong', maxLength: MAX_REASON_LENGTH })
  @RequiredText(MAX_REASON_LENGTH, 'Say what was wrong.')
  reason: string;
}
