import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { IsIn, IsInt, IsUUID, Min, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { CouponCellDto } from './coupon.dto';
import { TypedValuesDto } from './entered-setting.dto';

const MARKING_OUTCOMES = ['marked', 'differs', 'skipped'] as const;
const MAX_NOTE_LENGTH = 500;
const MAX_PLACE_LENGTH = 120;
const MAX_AMBIENT_LENGTH = 500;

export class MarkCellDto {
  @ApiProperty({ format: 'uuid', description: 'The cell' })
  @IsUUID('all', { message: 'This does not name a cell.' })
  cellId: string;

  @ApiProperty({ description: 'Version of the cell that was seen', minimum: 1 })
  @IsInt()
  @Min(1)
  cellVersion: number;

  @ApiProperty({ enum: MARKING_OUTCOMES, description: 'marked: as planned; differs: with other values; skipped: not marked' })
  @IsIn(MARKING_OUTCOMES, { message: 'Choose marked, differs or skipped.' })
  outcome: (typeof MARKING_OUTCOMES)[number];

  @ApiPropertyOptional({ type: TypedValuesDto, description: 'Only with differs: the values that were really used, where they differ' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => TypedValuesDto)
  actual?: TypedValuesDto;

  @ApiPropertyOptional({ description: 'Why; needed when skipped', maxLength: MAX_NOTE_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTE_LENGTH)
  note?: string;
}

export class UndoMarkDto {
  @ApiProperty({ format: 'uuid', description: 'The cell that is to be marked again' })
  @IsUUID('all', { message: 'This does not name a cell.' })
  cellId: string;

  @ApiProperty({ description: 'Version of the cell that was seen', minimum: 1 })
  @IsInt()
  @Min(1)
  cellVersion: number;
}

export class FinishMarkingDto {
  @ApiPropertyOptional({ description: 'Room, temperature and the like; absent: unchanged', maxLength: MAX_AMBIENT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_AMBIENT_LENGTH)
  ambientNotes?: string;

  @ApiPropertyOptional({ description: 'Where the plate is kept; absent: unchanged', maxLength: MAX_PLACE_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_PLACE_LENGTH)
  storedAt?: string;
}

/** A cell after the act, with how far the plate is. */
export class MarkedCellDto {
  @ApiProperty({ type: CouponCellDto, description: 'The cell as it stands now' }) cell: CouponCellDto;
  @ApiProperty({ description: 'Cells that are marked or skipped' }) doneCount: number;
  @ApiProperty({ description: 'Cells on the plate' }) cellCount: number;
}
