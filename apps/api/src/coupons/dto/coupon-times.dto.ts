import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsUUID } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { CLOCK_LIMITS_S, LoggedTimeDto, MarkTimeDto } from '../../machines/dto/marking-time.dto';

/** A cell, or all marked cells, as somebody clocked them. What was set is read from the coupon, not asked for. */
export class LogCouponTimeDto {
  @ApiProperty({ description: 'Clocked time of marking alone, without dialling in and without the labels, s' })
  @NumberBetween(CLOCK_LIMITS_S.low, CLOCK_LIMITS_S.high, { what: 'The time', unit: 's' })
  seconds: number;

  @ApiPropertyOptional({ format: 'uuid', description: 'The cell; absent: all cells but the skipped ones' })
  @MayBeAbsent()
  @IsUUID(undefined, { message: 'Choose a cell of the coupon.' })
  cellId?: string;
}

export class CellTimeDto {
  @ApiProperty({ format: 'uuid', description: 'Id of the cell' }) cellId: string;
  @ApiProperty({ type: MarkTimeDto, description: 'Its predicted time' }) predicted: MarkTimeDto;
}

export class CouponTimesDto {
  @ApiProperty({ type: MarkTimeDto, description: 'Predicted time of all cells but the skipped ones, labels not counted' })
  whole: MarkTimeDto;
  @ApiProperty({ type: [CellTimeDto], description: 'Predicted time of each cell' }) cells: CellTimeDto[];
  @ApiProperty({ type: [LoggedTimeDto], description: 'Logged times, newest first' }) items: LoggedTimeDto[];
}
