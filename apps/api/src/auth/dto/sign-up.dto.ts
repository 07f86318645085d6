import { ApiProperty } from '@nestjs/swagger';
import { IsEmail, IsIn, IsString, IsTimeZone, MaxLength, MinLength } from 'class-validator';
import { IsLocaleTag } from '../../common/decorators/is-locale-tag';
import { Trimmed } from '../../common/decorators/trimmed';
import { MAX_EMAIL_LENGTH } from '../../members/dto/create-invitation.dto';
import { MAX_PERSON_NAME_LENGTH } from '../../members/dto/update-member.dto';
import { UNIT_SYSTEMS, type UnitSystem } from '../../shops/dto/shop.dto';
import { MAX_SHOP_NAME_LENGTH } from '../../shops/dto/update-shop.dto';
import { IsNewPassword, MAX_PASSWORD_LENGTH, MIN_PASSWORD_LENGTH } from '../hashing/password-rules';

export class SignUpDto {
  @ApiProperty({ minLength: 1, maxLength: MAX_SHOP_NAME_LENGTH })
  @Trimmed()
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_SHOP_NAME_LENGTH)
  shopName: string;

  @ApiProperty({ minLength: 1, maxLength: MAX_PERSON_NAME_LENGTH, description: 'Name of the owner, as it will stand under signatures' })
  @Trimmed()
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_PERSON_NAME_LENGTH)
  name: string;

  @ApiProperty({ format: 'email', maxLength: MAX_EMAIL_LENGTH })
  @Trimmed()
  @MaxLength(MAX_EMAIL_LENGTH)
  @IsEmail()
  email: string;

  @ApiProperty({ minLength: MIN_PASSWORD_LENGTH, maxLength: MAX_PASSWORD_LENGTH, description: 'Code points after NFKC; any characters' })
  @IsNewPassword()
  password: string;

  @ApiProperty({ enum: UNIT_SYSTEMS })
  @IsIn(UNIT_SYSTEMS)
  unitSystem: UnitSystem;

  @ApiProperty({ description: 'IANA time zone, such as Europe/Berlin' })
  @IsTimeZone()
  timeZone: string;

  @ApiProperty({ description: 'BCP 47 language tag, such as en-GB' })
  @IsLocaleTag()
  locale: string;
}
