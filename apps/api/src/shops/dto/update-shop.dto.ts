import { ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { IsIn, IsString, IsTimeZone, MaxLength, MinLength, ValidateNested } from 'class-validator';
import { IsLocaleTag } from '../../common/decorators/is-locale-tag';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { Trimmed } from '../../common/decorators/trimmed';
import { UNIT_SYSTEMS, type UnitSystem } from './shop.dto';
import { ShopPolicyDto } from './shop-policy.dto';

export const MAX_SHOP_NAME_LENGTH = 120;
const MAX_TYPED_PASSWORD_LENGTH = 512;

export class UpdateShopDto {
  @ApiPropertyOptional({ minLength: 1, maxLength: MAX_SHOP_NAME_LENGTH })
  @MayBeAbsent()
  @Trimmed()
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_SHOP_NAME_LENGTH)
  name?: string;

  @ApiPropertyOptional({ enum: UNIT_SYSTEMS })
  @MayBeAbsent()
  @IsIn(UNIT_SYSTEMS)
  unitSystem?: UnitSystem;

  @ApiPropertyOptional({ description: 'IANA time zone' })
  @MayBeAbsent()
  @IsTimeZone()
  timeZone?: string;

  @ApiPropertyOptional({ description: 'BCP 47 language tag' })
  @MayBeAbsent()
  @IsLocaleTag()
  locale?: string;

  @ApiPropertyOptional({ type: ShopPolicyDto, description: 'The whole policy; a change of it is a signed act' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => ShopPolicyDto)
  policy?: ShopPolicyDto;

  @ApiPropertyOptional({ description: 'Password of the owner who signs; needed when the policy changes' })
  @MayBeAbsent()
  @IsString()
  @MaxLength(MAX_TYPED_PASSWORD_LENGTH)
  password?: string;
}
