import { ApiProperty } from '@nestjs/swagger';
import { CouponEffectDto, CouponMachineDto, CouponMaterialDto, NamedDto } from '../../coupons/dto/coupon.dto';

/** What makes two recipes answer the same question. */
export class RecipeKeysDto {
  @ApiProperty({ type: CouponMaterialDto, description: 'Material' }) material: CouponMaterialDto;
  @ApiProperty({ type: NamedDto, description: 'Finish' }) finish: NamedDto;
  @ApiProperty({ type: CouponEffectDto, description: 'Effect' }) effect: CouponEffectDto;
  @ApiProperty({ type: CouponMachineDto, description: 'Machine' }) machine: CouponMachineDto;
  @ApiProperty({ type: NamedDto, description: 'Lens' }) lens: NamedDto;
}
