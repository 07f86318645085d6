import { ApiProperty } from '@nestjs/swagger';
import { ROLES, type Role } from '@proofplate/recipe-model';
import { UNIT_SYSTEMS, type UnitSystem } from '../../shops/dto/shop.dto';

export class SessionPersonDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty() name: string;
  @ApiProperty({ format: 'email' }) email: string;
}

export class SessionMemberDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty({ enum: [...ROLES] }) role: Role;
  @ApiProperty({ description: 'Name as it stands under signatures' }) printedName: string;
}

export class SessionShopDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty() name: string;
  @ApiProperty({ enum: UNIT_SYSTEMS }) unitSystem: UnitSystem;
  @ApiProperty() timeZone: string;
  @ApiProperty() locale: string;
}

export class ShopChoiceDto {
  @ApiProperty({ format: 'uuid', description: 'Send as shopId when signing in to work in this shop' }) id: string;
  @ApiProperty() name: string;
  @ApiProperty({ enum: [...ROLES] }) role: Role;
}

export class SessionDto {
  @ApiProperty({ type: SessionPersonDto }) person: SessionPersonDto;
  @ApiProperty({ type: SessionMemberDto }) member: SessionMemberDto;
  @ApiProperty({ type: SessionShopDto, description: 'The shop that this session works in' }) shop: SessionShopDto;
  @ApiProperty({ type: [ShopChoiceDto], description: 'Every shop the person is in' }) shops: ShopChoiceDto[];
}

export class SignedInDto extends SessionDto {
  @ApiProperty({ description: 'Send as Authorization: Bearer …; keep it in memory only' }) accessToken: string;
  @ApiProperty({ format: 'date-time', description: 'Refresh before then' }) expiresAt: string;
}
