import { ApiPropertyOptional } from '@nestjs/swagger';
import { IsIn, IsOptional } from 'class-validator';
import { PageQuery } from '../../common/pagination/page';

const MEMBER_STATES = ['active', 'removed'] as const;

export class ListMembersQuery extends PageQuery {
  @ApiPropertyOptional({ enum: MEMBER_STATES, default: 'active' })
  @IsOptional()
  @IsIn(MEMBER_STATES)
  state: (typeof MEMBER_STATES)[number] = 'active';
}
