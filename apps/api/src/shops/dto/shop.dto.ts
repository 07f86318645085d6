import { ApiProperty } from '@nestjs/swagger';
import { ShopPolicyDto } from './shop-policy.dto';

export const UNIT_SYSTEMS = ['metric', 'inch'] as const;
export type UnitSystem = (typeof UNIT_SYSTEMS)[number];

export class ShopDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty() name: string;
  @ApiProperty({ enum: UNIT_SYSTEMS, description: 'Units that pages show first' }) unitSystem: UnitSystem;
  @ApiProperty({ description: 'IANA time zone, such as Europe/Berlin' }) timeZone: string;
  @ApiProperty({ description: 'BCP 47 language tag, such as en-GB' }) locale: string;
  @ApiProperty({ type: ShopPolicyDto }) policy: ShopPolicyDto;
  @ApiProperty({ format: 'date-time' }) createdAt: string;
  @ApiProperty({ description: 'Version for If-Match' }) version: number;
  @ApiProperty({ type: [String], description: 'Acts that the caller may do now' }) allowedActions: string[];
}
