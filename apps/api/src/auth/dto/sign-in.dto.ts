import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsEmail, IsString, IsUUID, MaxLength, MinLength } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { Trimmed } from '../../common/decorators/trimmed';
import { MAX_EMAIL_LENGTH } from '../../members/dto/create-invitation.dto';
import { MAX_TYPED_PASSWORD_LENGTH } from '../hashing/password-rules';

export class SignInDto {
  @ApiProperty({ format: 'email', maxLength: MAX_EMAIL_LENGTH })
  @Trimmed()
  @MaxLength(MAX_EMAIL_LENGTH)
  @IsEmail()
  email: string;

  @ApiProperty({ minLength: 1, maxLength: MAX_TYPED_PASSWORD_LENGTH })
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_TYPED_PASSWORD_LENGTH)
  password: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Which shop to work in, for people who are in several' })
  @MayBeAbsent()
  @IsUUID()
  shopId?: string;
}
