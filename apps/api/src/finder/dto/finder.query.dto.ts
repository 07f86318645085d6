import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsOptional, IsUUID, Matches } from 'class-validator';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';

const MAX_WORDS_LENGTH = 120;
const RECIPE_KEY = /^(?:R-\d{1,9}|[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12})$/iu;

/** The sentence as far as it is filled in. */
export class FinderQuery {
  @ApiPropertyOptional({ format: 'uuid', description: 'Machine' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a machine.' })
  machineId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Lens' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a lens.' })
  lensId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Material' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a material.' })
  materialId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Finish' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a finish.' })
  finishId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Effect' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name an effect.' })
  effectId?: string;

  @ApiPropertyOptional({ description: 'One recipe by id or code: a link to it, or one of several left that differ in scope only' })
  @IsOptional()
  @Matches(RECIPE_KEY, { message: 'This does not name a recipe.' })
  recipeId?: string;

  @ApiPropertyOptional({ description: 'Words that narrow all slots at once, such as “blk anod”', maxLength: MAX_WORDS_LENGTH })
  @IsOptional()
  @TrimmedText(MAX_WORDS_LENGTH)
  words?: string;
}

export class SheetCodeQuery {
  @ApiProperty({ format: 'uuid', description: 'Recipe of the sheet' })
  @IsUUID('all', { message: 'This does not name a recipe.' })
  recipeId: string;
}

export class FindQuery {
  @ApiPropertyOptional({ description: 'Letters of a code or a name', maxLength: MAX_WORDS_LENGTH })
  @RequiredText(MAX_WORDS_LENGTH, 'Type a few letters of a code or a name.')
  q: string;
}
