import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Transform } from 'class-transformer';
import { ArrayMaxSize, ArrayMinSize, ArrayUnique, IsArray, IsOptional, IsUUID } from 'class-validator';
import { ChangeSizeDto, RecipeRevisionDto } from './recipe-revision.dto';

const FEWEST = 2;
const MOST = 4;

export class CompareQuery {
  @ApiProperty({ type: String, description: 'Two to four revisions, separated by commas, in the order of the columns' })
  @Transform(({ value }: { value: unknown }) => (typeof value === 'string' ? value.split(',').map((id) => id.trim()) : value))
  @IsArray({ message: 'Choose two to four revisions.' })
  @ArrayMinSize(FEWEST, { message: 'Choose at least two revisions.' })
  @ArrayMaxSize(MOST, { message: 'Choose at most four revisions.' })
  @ArrayUnique({ message: 'Choose different revisions.' })
  @IsUUID('all', { each: true, message: 'Choose revisions of the shop.' })
  ids: string[];

  @ApiPropertyOptional({
    format: 'uuid',
    description: 'Revision that the others are compared with; absent: the approved one, else the first',
  })
  @IsOptional()
  @IsUUID('all', { message: 'Choose one of the compared revisions.' })
  referenceId?: string;
}

export class ComparedValueDto {
  @ApiProperty({ format: 'uuid', description: 'Revision of the column' }) revisionId: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Number in the unit of the row; null: a word, or not known' }) value:
    | number
    | null;
  @ApiProperty({ type: String, nullable: true, description: 'The value as shown, without its unit; null: not set or not known' }) text:
    | string
    | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why there is no value' }) missingBecause: string | null;
  @ApiProperty({ enum: ['reference', 'same', 'changed', 'added', 'removed', 'not comparable'], description: 'Against the reference' })
  change: 'reference' | 'same' | 'changed' | 'added' | 'removed' | 'not comparable';
  @ApiProperty({ type: ChangeSizeDto, nullable: true, description: 'Size of the change; null for words' }) size: ChangeSizeDto | null;
}

export class ComparisonRowDto {
  @ApiProperty({ enum: ['entered', 'work', 'mark'], description: 'What is typed, what reaches the work, what the mark is' })
  group: 'entered' | 'work' | 'mark';
  @ApiProperty({ description: 'Key of the row; unique within group and step' }) key: string;
  @ApiProperty({ description: 'The row in words' }) label: string;
  @ApiProperty({ description: 'Unit of the numbers; empty for words' }) unit: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Mark step from 1; null: the mark as a whole' }) step: number | null;
  @ApiProperty({ description: 'true: every column holds the same' }) isSame: boolean;
  @ApiProperty({ type: [ComparedValueDto], description: 'One per column, in the order of the columns' }) values: ComparedValueDto[];
}

export class ComparisonDto {
  @ApiProperty({ type: [RecipeRevisionDto], description: 'The revisions, in the order of the columns' }) revisions: RecipeRevisionDto[];
  @ApiProperty({ format: 'uuid', description: 'Revision that the others are compared with' }) referenceId: string;
  @ApiProperty({ type: [ComparisonRowDto], description: 'Rows in reading order' }) rows: ComparisonRowDto[];
}
