import { ApiPropertyOptional } from '@nestjs/swagger';
import { Transform } from 'class-transformer';
import { IsBoolean, IsOptional } from 'class-validator';
import { PageQuery } from './page';

/** Query of a list whose things can be archived. */
export class ArchivedQuery extends PageQuery {
  @ApiPropertyOptional({ description: 'true: the archived ones instead of those in use', default: false })
  @IsOptional()
  @Transform(({ value }: { value: unknown }) => (value === 'true' ? true : value === 'false' ? false : value))
  @IsBoolean()
  archived: boolean = false;
}
