import { ApiProperty } from '@nestjs/swagger';
import { IsString, MaxLength, MinLength } from 'class-validator';
import { IsNewPassword, MAX_PASSWORD_LENGTH, MAX_TYPED_PASSWORD_LENGTH, MIN_PASSWORD_LENGTH } from '../hashing/password-rules';

export class ChangePasswordDto {
  @ApiProperty({ minLength: 1, maxLength: MAX_TYPED_PASSWORD_LENGTH, description: 'The present password' })
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_TYPED_PASSWORD_LENGTH)
  password: string;

  @ApiProperty({ minLength: MIN_PASSWORD_LENGTH, maxLength: MAX_PASSWORD_LENGTH, description: 'Code points after NFKC; any characters' })
  @IsNewPassword()
  newPassword: string;
}

export class OpenSessionDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty({ description: 'True for the session that asks' }) isCurrent: boolean;
  @ApiProperty({ type: String, nullable: true, description: 'Shop it works in; null when the person has left that shop' }) shopName:
    | string
    | null;
  @ApiProperty({ type: String, nullable: true, description: 'What the browser said of itself; a hint, never a proof' }) userAgent:
    | string
    | null;
  @ApiProperty({ format: 'date-time', description: 'When somebody signed in there' }) startedAt: string;
  @ApiProperty({ format: 'date-time', description: 'Last renewal, to about ten minutes' }) lastSeenAt: string;
  @ApiProperty({ format: 'date-time', description: 'Ends then unless it is used before' }) expiresAt: string;
}

export class OpenSessionListDto {
  @ApiProperty({ type: [OpenSessionDto], description: 'The latest use first' }) items: OpenSessionDto[];
}
