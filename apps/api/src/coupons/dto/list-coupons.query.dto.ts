import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import type { CouponState } from '@proofplate/recipe-model';
import { IsIn, IsOptional, IsUUID } from 'class-validator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { PageQuery } from '../../common/pagination/page';
import { COUPON_PURPOSES, COUPON_STATES, type CouponPurpose } from './coupon.dto';

const MAX_SEARCH_LENGTH = 120;

export class ListCouponsQuery extends PageQuery {
  @ApiPropertyOptional({ enum: COUPON_STATES, description: 'Only coupons in this state' })
  @IsOptional()
  @IsIn(COUPON_STATES, { message: 'This is no state of a coupon.' })
  state?: CouponState;

  @ApiPropertyOptional({ enum: COUPON_PURPOSES, description: 'Only coupons for this purpose' })
  @IsOptional()
  @IsIn(COUPON_PURPOSES, { message: 'This is no purpose of a coupon.' })
  purpose?: CouponPurpose;

  @ApiPropertyOptional({ format: 'uuid', description: 'Only this material' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a material.' })
  materialId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Only this effect' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name an effect.' })
  effectId?: string;

  @ApiPropertyOptional({ format: 'uuid', description: 'Only this machine' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a machine.' })
  machineId?: string;

  @ApiPropertyOptional({
    description: 'Words to find in code, title, material, finish, lot or place of storage',
    maxLength: MAX_SEARCH_LENGTH,
  })
  @IsOptional()
  @TrimmedText(MAX_SEARCH_LENGTH)
  q?: string;
}

export class CouponFacetValueDto {
  @ApiProperty({ description: 'Code or id of the value' }) value: string;
  @ApiProperty({ description: 'The value in words' }) label: string;
  @ApiProperty({ description: 'Coupons that have it, with the other choices held' }) count: number;
}

/** Each count holds the other choices and leaves out its own. */
export class CouponFacetsDto {
  @ApiProperty({ type: [CouponFacetValueDto], description: 'States' }) states: CouponFacetValueDto[];
  @ApiProperty({ type: [CouponFacetValueDto], description: 'Materials' }) materials: CouponFacetValueDto[];
  @ApiProperty({ type: [CouponFacetValueDto], description: 'Effects' }) effects: CouponFacetValueDto[];
  @ApiProperty({ type: [CouponFacetValueDto], description: 'Machines' }) machines: CouponFacetValueDto[];
  @ApiProperty({ description: 'Coupons that fit all choices' }) matchCount: number;
  @ApiProperty({ description: 'Coupons of the shop' }) totalCount: number;
}
