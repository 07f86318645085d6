import { ApiPropertyOptional } from '@nestjs/swagger';
import { IsIn, IsOptional, IsUUID } from 'class-validator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { PageQuery } from '../../common/pagination/page';
import { RECIPE_STATES, type RecipeState } from './recipe.dto';

const MAX_SEARCH_LENGTH = 120;

export class ListRecipesQuery extends PageQuery {
  @ApiPropertyOptional({ enum: RECIPE_STATES, description: 'Only recipes that stand so' })
  @IsOptional()
  @IsIn(RECIPE_STATES, { message: 'This is no state of a recipe.' })
  state?: RecipeState;

  @ApiPropertyOptional({ format: 'uuid', description: 'Only this material' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a material.' })
  materialId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Only this effect' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name an effect.' })
  effectId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Only this machine' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a machine.' })
  machineId?: string;

  @ApiPropertyOptional({ description: 'Words to find in code, title, material, finish, effect or machine', maxLength: MAX_SEARCH_LENGTH })
  @IsOptional()
  @TrimmedText(MAX_SEARCH_LENGTH)
  q?: string;
}
