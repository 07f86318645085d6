import { ApiProperty } from '@nestjs/swagger';
import { ROLES, type Role } from '@proofplate/recipe-model';
import { IsEmail, IsIn, MaxLength } from 'class-validator';
import { Trimmed } from '../../common/decorators/trimmed';

export const MAX_EMAIL_LENGTH = 254;

export class CreateInvitationDto {
  @ApiProperty({ format: 'email', maxLength: MAX_EMAIL_LENGTH, description: 'Where the invitation goes' })
  @Trimmed()
  @MaxLength(MAX_EMAIL_LENGTH)
  @IsEmail()
  email: string;

  @ApiProperty({ enum: [...ROLES], description: 'Role that the person will have' })
  @IsIn(ROLES)
  role: Role;
}
