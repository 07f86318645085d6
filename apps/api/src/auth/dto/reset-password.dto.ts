import { ApiProperty } from '@nestjs/swagger';
import { IsEmail, IsString, MaxLength, MinLength } from 'class-validator';
import { Trimmed } from '../../common/decorators/trimmed';
import { MAX_EMAIL_LENGTH } from '../../members/dto/create-invitation.dto';
import { IsNewPassword, MAX_PASSWORD_LENGTH, MIN_PASSWORD_LENGTH } from '../hashing/password-rules';

export const MAX_LINK_TOKEN_LENGTH = 200;

export class ForgotPasswordDto {
  @ApiProperty({ format: 'email', maxLength: MAX_EMAIL_LENGTH })
  @Trimmed()
  @MaxLength(MAX_EMAIL_LENGTH)
  @IsEmail()
  email: string;
}

export class ResetPasswordDto {
  @ApiProperty({ description: 'Token of the link in the mail' })
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_LINK_TOKEN_LENGTH)
  token: string;

  @ApiProperty({ minLength: MIN_PASSWORD_LENGTH, maxLength: MAX_PASSWORD_LENGTH })
  @IsNewPassword()
  password: string;
}
