import { Body, Controller, Get, HttpCode, Param, Post, Put } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { PhotoDto } from './dto/photo.dto';
import { SetCornersDto } from './dto/set-corners.dto';
import { PhotosService } from './photos.service';

@ApiTags('photos')
@ApiBearerAuth()
@Controller('photos')
export class PhotosController {
  constructor(private readonly photos: PhotosService) {}

  @Get(':photoId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One photo with its state and addresses' })
  @ApiOkResponse({ type: PhotoDto })
  get(@CurrentMember() actor: Actor, @Param('photoId', IdPipe) photoId: string) {
    return this.photos.get(actor, photoId);
  }

  @Put(':photoId/corners')
  @AtLeast('operator')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Say where the plate lies in the photo' })
  @ApiOkResponse({ type: PhotoDto })
  setCorners(
    @CurrentMember() actor: Actor,
    @Param('photoId', IdPipe) photoId: string,
    @IfMatch() version: number,
    @Body() dto: SetCornersDto,
  ) {
    return this.photos.setCorners(actor, photoId, version, dto);
  }

  @Post(':photoId/retry')
  @HttpCode(200)
  @AtLeast('operator')
  @ApiOperation({ summary: 'Process a photo again that is stuck; safe to repeat' })
  @ApiOkResponse({ type: PhotoDto })
  retry(@CurrentMember() actor: Actor, @Param('photoId', IdPipe) photoId: string) {
    return this.photos.retry(actor, photoId);
  }
}
