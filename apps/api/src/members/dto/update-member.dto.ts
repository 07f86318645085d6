import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { ROLES, type Role, SOURCE_KINDS, type SourceKind } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { ArrayMaxSize, IsArray, IsIn, IsOptional, IsString, IsUUID, MaxLength, MinLength, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { Trimmed } from '../../common/decorators/trimmed';

export const MAX_PERSON_NAME_LENGTH = 120;

/** Effects of a large shop times kinds of source. */
const MAX_PROCESSES = 500;

export class ProcessDto {
  @ApiProperty({ format: 'uuid' })
  @IsUUID()
  effectId: string;

  @ApiProperty({ enum: [...SOURCE_KINDS], description: 'Kind of laser source' })
  @IsIn(SOURCE_KINDS)
  sourceKind: SourceKind;
}

export class UpdateMemberDto {
  @ApiPropertyOptional({ enum: [...ROLES] })
  @MayBeAbsent()
  @IsIn(ROLES)
  role?: Role;

  @ApiPropertyOptional({
    minLength: 1,
    maxLength: MAX_PERSON_NAME_LENGTH,
    description: 'Name as it will stand under signatures from now on',
  })
  @MayBeAbsent()
  @Trimmed()
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_PERSON_NAME_LENGTH)
  printedName?: string;

  @ApiPropertyOptional({
    type: [ProcessDto],
    nullable: true,
    maxItems: MAX_PROCESSES,
    description: 'Processes that the member signs for as a lead or owner; null: all of them',
  })
  @IsOptional()
  @IsArray()
  @ArrayMaxSize(MAX_PROCESSES)
  @ValidateNested({ each: true })
  @Type(() => ProcessDto)
  signsFor?: ProcessDto[] | null;
}
