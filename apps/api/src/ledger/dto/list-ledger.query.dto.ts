import { ApiPropertyOptional, OmitType } from '@nestjs/swagger';
import { Transform } from 'class-transformer';
import { IsOptional, IsString, IsUUID, Matches, MaxLength } from 'class-validator';
import { IsDay } from '../../common/decorators/is-day';
import { PageQuery } from '../../common/pagination/page';

const MAX_NAME_LENGTH = 80;

export class ListLedgerQuery extends PageQuery {
  @ApiPropertyOptional({ description: 'Kind of thing, such as recipe' })
  @IsOptional()
  @IsString()
  @MaxLength(MAX_NAME_LENGTH)
  subjectType?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'One thing' })
  @IsOptional()
  @IsUUID()
  subjectId?: string;

  @ApiPropertyOptional({ description: 'Code that people read; C-0117 also finds its cells and photos', maxLength: MAX_NAME_LENGTH })
  @IsOptional()
  @Transform(({ value }) => (typeof value === 'string' ? value.trim().toUpperCase() : value))
  @IsString()
  @MaxLength(MAX_NAME_LENGTH)
  @Matches(/^[A-Z]+-[0-9]+( [A-Z0-9]+)?$/, { message: 'Type a code such as R-0031, C-0117 or J-0007.' })
  subjectCode?: string;

  @ApiPropertyOptional({ description: 'What happened, such as recipe.submitted' })
  @IsOptional()
  @IsString()
  @MaxLength(MAX_NAME_LENGTH)
  action?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Who acted' })
  @IsOptional()
  @IsUUID()
  actorMemberId?: string;

  @ApiPropertyOptional({ format: 'date', description: 'First day, in the time zone of the shop' })
  @IsOptional()
  @IsDay()
  fromDay?: string;

  @ApiPropertyOptional({ format: 'date', description: 'Last day, in the time zone of the shop' })
  @IsOptional()
  @IsDay()
  toDay?: string;
}

/** An export has all that match. */
export class ExportLedgerQuery extends OmitType(ListLedgerQuery, ['limit', 'cursor']) {}
