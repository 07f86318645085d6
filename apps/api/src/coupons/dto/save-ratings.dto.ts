import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { OUTCOMES, type Outcome } from '@proofplate/recipe-model';
import { Transform, Type } from 'class-transformer';
import {
  ArrayMaxSize,
  ArrayMinSize,
  ArrayUnique,
  IsArray,
  IsIn,
  IsInt,
  IsNotEmpty,
  IsOptional,
  IsString,
  IsUUID,
  Max,
  MaxLength,
  Min,
  ValidateIf,
  ValidateNested,
} from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { MAX_CELLS_AT_ONCE } from './batch-limits';

export const BEST_RATING = 5;
const MAX_TAGS = 12;
const MAX_TAG_LENGTH = 40;
const MAX_NOTE_LENGTH = 1000;

export class CellRatingChangeDto {
  @ApiProperty({ description: 'Cell', format: 'uuid' })
  @IsUUID('all', { message: 'This does not name a cell.' })
  cellId: string;

  @ApiProperty({ type: Number, nullable: true, description: 'Version of your own rating that you saw; null: there was none' })
  @ValidateIf((_, value) => value !== null)
  @IsInt({ message: 'Say which version of your rating you saw; null when there was none.' })
  @Min(1)
  seenVersion: number | null;

  @ApiProperty({ type: Number, nullable: true, minimum: 0, maximum: BEST_RATING, description: '0 to 5; null: not rated' })
  @ValidateIf((_, value) => value !== null)
  @IsInt({ message: 'A rating is a whole number from 0 to 5.' })
  @Min(0, { message: 'A rating is a whole number from 0 to 5.' })
  @Max(BEST_RATING, { message: 'A rating is a whole number from 0 to 5.' })
  rating: number | null;

  @ApiPropertyOptional({ type: String, nullable: true, enum: [...OUTCOMES, null], description: 'What the mark looks like' })
  @IsOptional()
  @IsIn([...OUTCOMES], { message: 'Choose the outcome from the list.' })
  outcome?: Outcome | null;

  @ApiPropertyOptional({ type: [String], description: 'Tags' })
  @MayBeAbsent()
  @Transform(({ value }: { value: unknown }) =>
    Array.isArray(value) ? value.map((tag: unknown) => (typeof tag === 'string' ? tag.trim() : tag)) : value,
  )
  @IsArray()
  @ArrayMaxSize(MAX_TAGS, { message: `Give at most ${MAX_TAGS} tags.` })
  @ArrayUnique({ message: 'Each tag once is enough.' })
  @IsString({ each: true })
  @IsNotEmpty({ each: true, message: 'A tag needs at least one character.' })
  @MaxLength(MAX_TAG_LENGTH, { each: true, message: `A tag has ${MAX_TAG_LENGTH} characters at most.` })
  tags?: string[];

  @ApiPropertyOptional({ description: 'Note', maxLength: MAX_NOTE_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTE_LENGTH)
  note?: string;
}

export class SaveRatingsDto {
  @ApiProperty({ type: [CellRatingChangeDto], minItems: 1, maxItems: MAX_CELLS_AT_ONCE, description: 'Your ratings, all or none' })
  @IsArray()
  @ArrayMinSize(1, { message: 'Rate at least one cell.' })
  @ArrayMaxSize(MAX_CELLS_AT_ONCE, { message: `Send at most ${MAX_CELLS_AT_ONCE} ratings at once.` })
  @ArrayUnique((change: CellRatingChangeDto) => change?.cellId, { message: 'Each cell once is enough.' })
  @ValidateNested({ each: true })
  @Type(() => CellRatingChangeDto)
  ratings: CellRatingChangeDto[];
}
