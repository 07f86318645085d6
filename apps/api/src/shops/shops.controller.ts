import { Body, Controller, Get, Patch } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { ShopDto } from './dto/shop.dto';
import { UpdateShopDto } from './dto/update-shop.dto';
import { ShopsService } from './shops.service';

@ApiTags('shop')
@ApiBearerAuth()
@Controller('shop')
export class ShopsController {
  constructor(private readonly shops: ShopsService) {}

  @Get()
  @AtLeast('lead')
  @ApiOperation({ summary: 'The shop with its policy' })
  @ApiOkResponse({ type: ShopDto })
  get(@CurrentMember() actor: Actor): Promise<ShopDto> {
    return this.shops.get(actor);
  }

  @Patch()
  @AtLeast('owner')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change the shop; a changed policy needs the owner’s password' })
  @ApiOkResponse({ type: ShopDto })
  update(@CurrentMember() actor: Actor, @IfMatch() version: number, @Body() dto: UpdateShopDto): Promise<ShopDto> {
    return this.shops.update(actor, version, dto);
  }
}
