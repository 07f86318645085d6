import { ApiPropertyOptional } from '@nestjs/swagger';
import { ROLES, type Role } from '@proofplate/recipe-model';
import { IsIn, IsOptional, IsString, MaxLength, MinLength } from 'class-validator';
import { Trimmed } from '../../common/decorators/trimmed';

export const MAX_PERSON_NAME_LENGTH = 120;

export class UpdateMemberDto {
  @ApiPropertyOptional({ enum: [...ROLES] })
  @IsOptional()
  @IsIn(ROLES)
  role?: Role;

  @ApiPropertyOptional({
    minLength: 1,
    maxLength: MAX_PERSON_NAME_LENGTH,
    description: 'Name as it will stand under signatures from now on',
  })
  @IsOptional()
  @Trimmed()
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_PERSON_NAME_LENGTH)
  printedName?: string;
}
