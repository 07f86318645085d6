import { ApiPropertyOptional } from '@nestjs/swagger';
import { IsOptional, IsString, IsUUID, MaxLength } from 'class-validator';
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

  @ApiPropertyOptional({ description: 'What happened, such as recipe.submitted' })
  @IsOptional()
  @IsString()
  @MaxLength(MAX_NAME_LENGTH)
  action?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Who acted' })
  @IsOptional()
  @IsUUID()
  actorMemberId?: string;
}
