import { ApiProperty, ApiPropertyOptional, PartialType } from '@nestjs/swagger';
import { type CautionLevel, MATERIAL_FAMILY_KEYS, type MaterialFamily, SOURCE_KINDS, type SourceKind } from '@proofplate/recipe-model';
import { Transform, Type } from 'class-transformer';
import {
  ArrayMaxSize,
  ArrayUnique,
  IsArray,
  IsBoolean,
  IsDefined,
  IsIn,
  IsOptional,
  IsString,
  IsUUID,
  MaxLength,
  ValidateNested,
} from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText } from '../../common/decorators/trimmed-text.decorator';
import { PageOf, PageQuery } from '../../common/pagination/page';

const LEVELS = ['never', 'care'] as const;
const MAX_SUBJECT_LENGTH = 160;
const MAX_TEXT_LENGTH = 1000;
const MAX_SOURCE_LENGTH = 400;
const MAX_NAMED = 200;
const MAX_KEY_LENGTH = 160;

/** What a caution applies to: every condition that is given must hold; without any it applies to all work. */
export class CautionScopeDto {
  @ApiPropertyOptional({ enum: MATERIAL_FAMILY_KEYS, isArray: true, description: 'Families of material' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_NAMED)
  @ArrayUnique()
  @IsIn(MATERIAL_FAMILY_KEYS, { each: true, message: 'Choose families from the list.' })
  families?: MaterialFamily[];

  @ApiPropertyOptional({ type: [String], description: 'Materials of the shop' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_NAMED)
  @ArrayUnique()
  @IsUUID('all', { each: true, message: 'Choose materials of the shop.' })
  materialIds?: string[];

  @ApiPropertyOptional({ type: [String], description: 'Finishes of the shop' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_NAMED)
  @ArrayUnique()
  @IsUUID('all', { each: true, message: 'Choose finishes of the shop.' })
  finishIds?: string[];

  @ApiPropertyOptional({ enum: SOURCE_KINDS, isArray: true, description: 'Kinds of laser source' })
  @MayBeAbsent()
  @IsArray()
  @ArrayUnique()
  @IsIn(SOURCE_KINDS, { each: true, message: 'Choose kinds of source from the list.' })
  sourceKinds?: SourceKind[];

  @ApiPropertyOptional({ type: [String], description: 'Keys of effects' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_NAMED)
  @ArrayUnique()
  @IsString({ each: true })
  @MaxLength(MAX_KEY_LENGTH, { each: true })
  effectKeys?: string[];

  @ApiPropertyOptional({ description: 'true: only work on a round part that turns' })
  @MayBeAbsent()
  @IsIn([true], { message: 'Leave this out unless the caution is for round parts.' })
  roundPart?: boolean;
}

export class CreateCautionDto {
  @ApiProperty({ enum: LEVELS, description: 'never: refuses planning, drafting and running; care: stands beside the setting' })
  @IsIn(LEVELS, { message: 'Choose never or care.' })
  level: CautionLevel;

  @ApiProperty({ description: 'What to do, first', maxLength: MAX_SUBJECT_LENGTH })
  @RequiredText(MAX_SUBJECT_LENGTH, 'Begin with what to do, such as “Keep the extraction running”.')
  subject: string;

  @ApiProperty({ description: 'Why', maxLength: MAX_TEXT_LENGTH })
  @RequiredText(MAX_TEXT_LENGTH, 'Say why; people follow a reason.')
  text: string;

  @ApiProperty({ description: 'Where it comes from', maxLength: MAX_SOURCE_LENGTH })
  @RequiredText(MAX_SOURCE_LENGTH, 'Name the source, such as the manual and its page, or who decided it and when.')
  source: string;

  @ApiProperty({ type: CautionScopeDto, description: 'What it applies to; empty: all work' })
  @IsDefined()
  @ValidateNested()
  @Type(() => CautionScopeDto)
  appliesTo: CautionScopeDto;
}

/** Only what is given changes, and only towards more caution. */
export class UpdateCautionDto extends PartialType(CreateCautionDto) {}

export class CautionDto {
  @ApiProperty({ description: 'Id of the caution', format: 'uuid' }) id: string;
  @ApiProperty({ enum: LEVELS, description: 'never: it must not be marked; care: look here first' }) level: CautionLevel;
  @ApiProperty({ description: 'What to do, first' }) subject: string;
  @ApiProperty({ description: 'Why' }) text: string;
  @ApiProperty({ description: 'Where it comes from' }) source: string;
  @ApiProperty({ type: CautionScopeDto, description: 'What it applies to; empty: all work' }) appliesTo: CautionScopeDto;
  @ApiProperty({ description: 'true: it came with the shop; its words stay' }) isShipped: boolean;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: tighten, reword' }) allowedActions: string[];
}

export class CautionPageDto extends PageOf(CautionDto) {}

export class ListCautionsQuery extends PageQuery {}

/** The work in front of somebody. What is not known yet is left out. */
export class CautionsForQuery {
  @ApiProperty({ description: 'Material', format: 'uuid' })
  @IsUUID('all')
  materialId: string;

  @ApiPropertyOptional({ description: 'Finish', format: 'uuid' })
  @IsOptional()
  @IsUUID('all')
  finishId?: string;

  @ApiPropertyOptional({ description: 'Effect', format: 'uuid' })
  @IsOptional()
  @IsUUID('all')
  effectId?: string;

  @ApiPropertyOptional({ description: 'Machine', format: 'uuid' })
  @IsOptional()
  @IsUUID('all')
  machineId?: string;

  @ApiPropertyOptional({ description: 'true: the part is round and turns', default: false })
  @IsOptional()
  @Transform(({ value }: { value: unknown }) => (value === 'true' ? true : value === 'false' ? false : value))
  @IsBoolean()
  roundPart?: boolean;
}

export class CautionsForDto {
  @ApiProperty({ description: 'true: at least one caution says never; planning, drafting and running are refused' }) isForbidden: boolean;
  @ApiProperty({ type: [CautionDto], description: 'The cautions that apply, never first, then those that name the material' })
  items: CautionDto[];
}
