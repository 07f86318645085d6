import { ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { IsIn, IsOptional, IsString, IsTimeZone, MaxLength, MinLength, ValidateNested } from 'class-validator';
import { IsLocaleTag } from '../../common/decorators/is-locale-tag';
import { Trimmed } from '../../common/decorators/trimmed';
import { UNIT_SYSTEMS, type UnitSystem } from './shop.dto';
import { ShopPolicyDto } from './shop-policy.dto';

export const MAX_SHOP_NAME_LENGTH = 120;
const MAX_TYPED_PASSWORD_LENGTH = 512;

export class UpdateShopDto {
  @ApiPropertyOptional({ minLength: 1, maxLength: MAX_SHOP_NAME_LENGTH })
  @IsOptional()
  @Trimmed()
  @IsString()
  @MinLength(1)
  @MaxLength(MAX_SHOP_NAME_LENGTH)
  name?: string;

  @ApiPropertyOptional({ enum: UNIT_SYSTEMS })
  @IsOptional()
  @IsIn(UNIT_SYSTEMS)
  unitSystem?: UnitSystem;

  @ApiPropertyOptional({ description: 'IANA time zone' })
  @IsOptional()
  @IsTimeZone()
  timeZone?: string;

  @ApiPropertyOptional({ description: 'BCP 47 language tag' })
  @IsOptional()
  @IsLocaleTag()
  locale?: string;

  @ApiPropertyOptional({ type: ShopPolicyDto, description: 'The whole policy; a change of it is a signed act' })
  @IsOptional()
  @ValidateNested()
  @Type(() => ShopPolicyDto)
  policy?: ShopPolicyDto;

  @ApiPropertyOptional({ description: 'Password of the owner who signs; needed when the policy changes' })
  @IsOptional()
  @IsString()
  @MaxLength(MAX_TYPED_PASSWORD_LENGTH)
  password?: string;
}
