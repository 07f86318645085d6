import { Controller, Get, Header, Param, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiProduces, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { CouponListService } from './coupon-list.service';
import { CouponsService } from './coupons.service';
import { CouponDto, CouponPageDto } from './dto/coupon.dto';
import { CouponFacetsDto, ListCouponsQuery } from './dto/list-coupons.query.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons')
export class CouponsController {
  constructor(
    private readonly coupons: CouponsService,
    private readonly couponList: CouponListService,
  ) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Coupons of the shop with the faces of their plates, newest first' })
  @ApiOkResponse({ type: CouponPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListCouponsQuery) {
    return this.couponList.list(actor, query);
  }

  @Get('facets')
  @AtLeast('operator')
  @ApiOperation({ summary: 'What the list can be narrowed by, with counts' })
  @ApiOkResponse({ type: CouponFacetsDto })
  facets(@CurrentMember() actor: Actor, @Query() query: ListCouponsQuery) {
    return this.couponList.facets(actor, query);
  }

  @Get('export.csv')
  @AtLeast('operator')
  @Header('content-type', 'text/csv; charset=utf-8')
  @Header('content-disposition', 'attachment; filename="coupons.csv"')
  @ApiOperation({ summary: 'The same list as CSV, all pages' })
  @ApiProduces('text/csv')
  @ApiOkResponse({ schema: { type: 'string' } })
  exportCsv(@CurrentMember() actor: Actor, @Query() query: ListCouponsQuery) {
    return this.couponList.exportCsv(actor, query);
  }

  @Get(':couponId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One coupon with its grids and cells, by id or by code' })
  @ApiOkResponse({ type: CouponDto })
  get(@CurrentMember() actor: Actor, @Param('couponId') couponId: string) {
    return this.coupons.get(actor, couponId);
  }
}
