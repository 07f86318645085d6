import { ApiPropertyOptional } from '@nestjs/swagger';
import { RUN_KINDS, type RunKind } from '@proofplate/recipe-model';
import { IsIn, IsOptional, IsUUID } from 'class-validator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { PageQuery } from '../../common/pagination/page';
import { RUN_STATES, type RunState } from './run.dto';

const MAX_SEARCH_LENGTH = 120;

export class ListRunsQuery extends PageQuery {
  @ApiPropertyOptional({ description: 'Only runs of exactly this job', maxLength: MAX_SEARCH_LENGTH })
  @IsOptional()
  @TrimmedText(MAX_SEARCH_LENGTH)
  jobReference?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Only this recipe' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a recipe.' })
  recipeId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Only this machine' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a machine.' })
  machineId?: string;

  @ApiPropertyOptional({ enum: RUN_KINDS, enumName: 'RunKind', description: 'Only this kind' })
  @IsOptional()
  @IsIn(RUN_KINDS, { message: 'This is no kind of run.' })
  kind?: RunKind;

  @ApiPropertyOptional({ enum: RUN_STATES, description: 'Only runs in this state' })
  @IsOptional()
  @IsIn(RUN_STATES, { message: 'This is no state of a run.' })
  state?: RunState;

  @ApiPropertyOptional({ description: 'Words to find in code, job, part, lot, recipe or material', maxLength: MAX_SEARCH_LENGTH })
  @IsOptional()
  @TrimmedText(MAX_SEARCH_LENGTH)
  q?: string;
}
