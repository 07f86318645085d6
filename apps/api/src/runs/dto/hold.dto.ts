import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsIn, IsOptional, IsString, IsUUID, MaxLength } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText } from '../../common/decorators/trimmed-text.decorator';
import { PageOf, PageQuery } from '../../common/pagination/page';

const MAX_REASON_LENGTH = 1000;
const MAX_PASSWORD_LENGTH = 1024;

export class PlaceHoldDto {
  @ApiPropertyOptional({ description: 'Recipe to hold; give this or machineId', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a recipe.' })
  recipeId?: string;

  @ApiPropertyOptional({ description: 'Machine to hold; give this or recipeId', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a machine.' })
  machineId?: string;

  @ApiProperty({ description: 'Why; it is shown before everything else', maxLength: MAX_REASON_LENGTH })
  @RequiredText(MAX_REASON_LENGTH, 'Say why: whoever stands at the machine reads it first.')
  reason: string;

  @ApiPropertyOptional({ description: 'Own password; without it the session stands for the person' })
  @MayBeAbsent()
  @IsString()
  @MaxLength(MAX_PASSWORD_LENGTH)
  password?: string;
}

export class ReleaseHoldDto {
  @ApiProperty({ description: 'Why it may be used again', maxLength: MAX_REASON_LENGTH })
  @RequiredText(MAX_REASON_LENGTH, 'Say what was found and why it may be used again.')
  reason: string;

  @ApiPropertyOptional({ description: 'Own password; without it the session stands for the person' })
  @MayBeAbsent()
  @IsString()
  @MaxLength(MAX_PASSWORD_LENGTH)
  password?: string;
}

export class HoldDto {
  @ApiProperty({ description: 'Id of the hold', format: 'uuid' }) id: string;
  @ApiProperty({ enum: ['recipe', 'machine'], description: 'What is held' }) subject: 'recipe' | 'machine';
  @ApiProperty({ description: 'Id of what is held', format: 'uuid' }) subjectId: string;
  @ApiProperty({ description: 'What is held, as people call it' }) subjectName: string;
  @ApiProperty({ description: 'Why' }) reason: string;
  @ApiProperty({ description: 'Who placed it' }) placedBy: string;
  @ApiProperty({ format: 'date-time', description: 'Since when' }) placedAt: string;
  @ApiProperty({ type: String, nullable: true, description: 'Who released it; null: it is on' }) releasedBy: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was released' }) releasedAt: string | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why it was released' }) releaseReason: string | null;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: release' }) allowedActions: string[];
}

export class HoldPageDto extends PageOf(HoldDto) {}

export class ListHoldsQuery extends PageQuery {
  @ApiPropertyOptional({ enum: ['open', 'released'], description: 'Which ones', default: 'open' })
  @IsOptional()
  @IsIn(['open', 'released'], { message: 'Ask for open or released holds.' })
  state: 'open' | 'released' = 'open';
}
