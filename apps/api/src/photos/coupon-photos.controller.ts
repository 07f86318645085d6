import { Controller, Get, Param, Post, Query, Req, Res } from '@nestjs/common';
import {
  ApiBearerAuth,
  ApiBody,
  type ApiBodyOptions,
  ApiConsumes,
  ApiCreatedResponse,
  ApiOkResponse,
  ApiOperation,
  ApiTags,
} from '@nestjs/swagger';
import type { FastifyReply, FastifyRequest } from 'fastify';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { UPLOAD_LIMIT_BYTES } from '../common/http/http-options';
import { IdPipe } from '../common/pipes/id.pipe';
import { ListPhotosQuery } from './dto/list-photos.query.dto';
import { PhotoDto, PhotoPageDto } from './dto/photo.dto';
import { PhotoIntakeService } from './photo-intake.service';
import { PhotoFileMissingError, PhotoTooLargeError, UnsupportedPhotoError } from './photos.errors';
import { PhotosService } from './photos.service';
import { type ReceivedFile, receivePhotoFile } from './receive-photo-file';

/** Boundaries and field names around the file. */
const MULTIPART_OVERHEAD_BYTES = 64 * 1024;
const FILE_BODY: ApiBodyOptions = {
  schema: { type: 'object', required: ['file'], properties: { file: { type: 'string', format: 'binary' } } },
};

@ApiTags('photos')
@ApiBearerAuth()
@Controller('coupons/:couponId/photos')
export class CouponPhotosController {
  constructor(
    private readonly photos: PhotosService,
    private readonly intake: PhotoIntakeService,
  ) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Photos of a coupon, newest first' })
  @ApiOkResponse({ type: PhotoPageDto })
  list(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Query() query: ListPhotosQuery) {
    return this.photos.list(actor, couponId, query);
  }

  @Post()
  @AtLeast('operator')
  @ApiOperation({
    summary: 'Send a photo: JPEG, PNG or WebP, 25 MB at most',
    description: 'Needs no Idempotency-Key: the same bytes for the same coupon answer 200 with the photo that is there.',
  })
  @ApiConsumes('multipart/form-data')
  @ApiBody(FILE_BODY)
  @ApiCreatedResponse({ type: PhotoDto })
  @ApiOkResponse({ type: PhotoDto, description: 'these bytes were sent before' })
  async upload(
    @CurrentMember() actor: Actor,
    @Param('couponId', IdPipe) couponId: string,
    @Req() request: FastifyRequest,
    @Res({ passthrough: true }) reply: FastifyReply,
  ) {
    await this.intake.checkCoupon(actor, couponId);
    const file = await receive(request);
    try {
      const { photo, isNew } = await this.intake.take(actor, couponId, file);
      reply.status(isNew ? 201 : 200);
      return photo;
    } finally {
      await file.discard();
    }
  }
}

async function receive(request: FastifyRequest): Promise<ReceivedFile> {
  if (!request.isMultipart()) throw new UnsupportedPhotoError('Send the photo as form data with one field named file.');
  // A client that tells its length honestly is refused before it has sent the bytes.
  if (Number(request.headers['content-length']) > UPLOAD_LIMIT_BYTES + MULTIPART_OVERHEAD_BYTES) throw new PhotoTooLargeError();
  const part = await request.file();
  if (part === undefined) throw new PhotoFileMissingError('Choose a photo to send.');
  try {
    return await receivePhotoFile(part.file, () => part.file.truncated);
  } catch (error) {
    passOverRest(request);
    throw error;
  }
}

/** Half a request left unread would hold the connection, and most clients read no answer before they have sent all: so up to the limit is read away. */
function passOverRest({ raw }: FastifyRequest): void {
  let leftBytes = UPLOAD_LIMIT_BYTES + MULTIPART_OVERHEAD_BYTES;
  raw.unpipe();
  raw.on('data', (chunk: Buffer) => {
    leftBytes -= chunk.length;
    if (leftBytes < 0) raw.destroy();
  });
  raw.resume();
}
