import { ApiProperty } from '@nestjs/swagger';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { AREA_LIMITS_MM, CLOCK_LIMITS_S, LoggedTimeDto, TimedStepDto, TimeGroundDto } from '../../machines/dto/marking-time.dto';

export class AreaDto {
  @ApiProperty({ description: 'Width of the marked area along the lines, mm' })
  @NumberBetween(AREA_LIMITS_MM.low, AREA_LIMITS_MM.high, { what: 'The width', unit: 'mm' })
  widthMm: number;

  @ApiProperty({ description: 'Height of the marked area across the lines, mm' })
  @NumberBetween(AREA_LIMITS_MM.low, AREA_LIMITS_MM.high, { what: 'The height', unit: 'mm' })
  heightMm: number;
}

/** One piece of a run as it was clocked. What was set is read from the run, not asked for. */
export class LogRunTimeDto extends AreaDto {
  @ApiProperty({ description: 'Clocked time from the first line to the last one, s' })
  @NumberBetween(CLOCK_LIMITS_S.low, CLOCK_LIMITS_S.high, { what: 'The time', unit: 's' })
  seconds: number;
}

/** What the time of a part is worked out with, once its area is known. */
export class SettingTimingDto {
  @ApiProperty({ type: [TimedStepDto], description: 'Mark steps; none: see missingBecause' }) steps: TimedStepDto[];
  @ApiProperty({ description: 'Pauses between the mark steps, s' }) pausesS: number;
  @ApiProperty({ type: String, nullable: true, description: 'Why the time of this setting cannot be worked out' }) missingBecause:
    | string
    | null;
  @ApiProperty({ type: TimeGroundDto, description: 'Machine and its overheads' }) ground: TimeGroundDto;
}

export class RunTimesDto {
  @ApiProperty({ type: SettingTimingDto, description: 'What the time of a piece is worked out with' }) timing: SettingTimingDto;
  @ApiProperty({ type: AreaDto, nullable: true, description: 'Artwork of the part that was set up for the run' }) partArea: AreaDto | null;
  @ApiProperty({ type: [LoggedTimeDto], description: 'Logged times, newest first' }) items: LoggedTimeDto[];
}
