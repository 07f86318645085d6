import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { ROLES, type Role } from '@proofplate/recipe-model';
import { IsString, MaxLength, MinLength } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { Trimmed } from '../../common/decorators/trimmed';
import { MAX_PERSON_NAME_LENGTH } from '../../members/dto/update-member.dto';
import { MAX_TYPED_PASSWORD_LENGTH } from '../hashing/password-rules';
import { MAX_LINK_TOKEN_LENGTH } from './reset-password.dto';

export class InvitationTokenDto {
  @ApiProperty({ description: 'Token of the link in the mail' })
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_LINK_TOKEN_LENGTH)
  token: string;
}

export class InvitationPreviewDto {
  @ApiProperty({ description: 'Shop that invites' }) shopName: string;
  @ApiProperty({ format: 'email' }) email: string;
  @ApiProperty({ enum: [...ROLES] }) role: Role;
  @ApiProperty({ description: 'True: the address has an account, so its password is asked for and no name' }) hasAccount: boolean;
}

export class AcceptInvitationDto extends InvitationTokenDto {
  @ApiPropertyOptional({ maxLength: MAX_PERSON_NAME_LENGTH, description: 'Name under signatures; needed for a new account' })
  @MayBeAbsent()
  @Trimmed()
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_PERSON_NAME_LENGTH)
  name?: string;

  @ApiProperty({ description: 'A new password, or the present one of an existing account' })
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_TYPED_PASSWORD_LENGTH)
  password: string;
}
