import { Controller, Get, Param, Query, Res } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiProduces, ApiTags } from '@nestjs/swagger';
import type { FastifyReply } from 'fastify';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CouponArtworkService, type Download } from './coupon-artwork.service';
import { CouponArtworkQuery } from './dto/coupon-artwork.query.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons/:couponId')
export class CouponArtworkController {
  constructor(private readonly artworks: CouponArtworkService) {}

  @Get('artwork.svg')
  @AtLeast('operator')
  @ApiOperation({ summary: 'Artwork of the plate, 1 unit = 1 mm, with corner marks, letters, code and cells' })
  @ApiProduces('image/svg+xml')
  @ApiOkResponse({ schema: { type: 'string' } })
  async artwork(
    @CurrentMember() actor: Actor,
    @Param('couponId', IdPipe) couponId: string,
    @Query() { polarity }: CouponArtworkQuery,
    @Res({ passthrough: true }) reply: FastifyReply,
  ) {
    return asFile(reply, 'image/svg+xml; charset=utf-8', await this.artworks.artwork(actor, couponId, polarity));
  }

  @Get('cells.csv')
  @AtLeast('operator')
  @ApiOperation({ summary: 'Cells of the coupon in run order, with what the panel shows' })
  @ApiProduces('text/csv')
  @ApiOkResponse({ schema: { type: 'string' } })
  async cells(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Res({ passthrough: true }) reply: FastifyReply) {
    return asFile(reply, 'text/csv; charset=utf-8', await this.artworks.cells(actor, couponId));
  }
}

/** Codes hold letters, digits and hyphens only, so they need no escaping in the header. */
function asFile(reply: FastifyReply, type: string, { fileName, body }: Download): string {
  reply.header('content-type', type).header('content-disposition', `attachment; filename="${fileName}"`);
  return body;
}
