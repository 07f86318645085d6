import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { ArrayMaxSize, ArrayUnique, IsArray, IsUUID, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText } from '../../common/decorators/trimmed-text.decorator';
import { MAX_CELLS_AT_ONCE } from './batch-limits';

const MAX_REASON_LENGTH = 500;
const MAX_TEXT_LENGTH = 2000;

export class UnratedCellDto {
  @ApiProperty({ description: 'Cell', format: 'uuid' })
  @IsUUID('all', { message: 'This does not name a cell.' })
  cellId: string;

  @ApiProperty({ description: 'Why nobody rates it', maxLength: MAX_REASON_LENGTH })
  @RequiredText(MAX_REASON_LENGTH, 'Say why the cell is not rated.')
  reason: string;
}

export class InspectCouponDto {
  @ApiPropertyOptional({ type: [UnratedCellDto], description: 'Marked cells that nobody rates, each with the reason' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_CELLS_AT_ONCE)
  @ArrayUnique((cell: UnratedCellDto) => cell?.cellId, { message: 'Each cell once is enough.' })
  @ValidateNested({ each: true })
  @Type(() => UnratedCellDto)
  unratedCells?: UnratedCellDto[];
}

export class CorrectCouponDto {
  @ApiPropertyOptional({ format: 'uuid', description: 'Cell that it is about; absent: the whole coupon' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a cell.' })
  cellId?: string;

  @ApiProperty({ description: 'What is right instead', maxLength: MAX_TEXT_LENGTH })
  @RequiredText(MAX_TEXT_LENGTH, 'Write what is right instead.')
  text: string;

  @ApiProperty({ description: 'Why it is corrected', maxLength: MAX_REASON_LENGTH })
  @RequiredText(MAX_REASON_LENGTH, 'Write why it is corrected.')
  reason: string;
}
