import { Controller, Get, Header, Param, ParseEnumPipe, Query, StreamableFile } from '@nestjs/common';
import { ApiOkResponse, ApiOperation, ApiParam, ApiProduces, ApiTags } from '@nestjs/swagger';
import { Public } from '../common/decorators/public.decorator';
import { NotFoundError } from '../common/errors/domain-error';
import { IdPipe } from '../common/pipes/id.pipe';
import { Env } from '../config/env.validation';
import { keptObjectKey } from '../storage/object-keys';
import { ObjectMissingError } from '../storage/storage.errors';
import { StorageService } from '../storage/storage.service';
import { PhotoFileQuery } from './dto/photo-file.query.dto';
import { ADDRESS_LIFE_S, isSignedPhotoUrl, PHOTO_SIZES, type PhotoSize } from './photo-urls';

const SIZES = Object.fromEntries(PHOTO_SIZES.map((size) => [size, size]));

/** Pictures for `<img>`, which sends no token: the signed address is the right to see this one. */
@ApiTags('photos')
@Controller('photos')
export class PhotoFilesController {
  constructor(
    private readonly storage: StorageService,
    private readonly env: Env,
  ) {}

  @Get(':photoId/:size')
  @Public()
  @ApiOperation({ summary: 'The picture itself, by a signed address of PhotoDto.urls' })
  @ApiParam({ name: 'size', enum: PHOTO_SIZES })
  @ApiProduces('image/jpeg')
  @ApiOkResponse({ description: 'JPEG', schema: { type: 'string', format: 'binary' } })
  @Header('Cache-Control', `private, max-age=${ADDRESS_LIFE_S}, immutable`)
  @Header('Content-Security-Policy', "default-src 'none'; frame-ancestors 'none'; sandbox")
  @Header('Cross-Origin-Resource-Policy', 'same-origin')
  @Header('X-Content-Type-Options', 'nosniff')
  async get(
    @Param('photoId', IdPipe) photoId: string,
    @Param('size', new ParseEnumPipe(SIZES, { exceptionFactory: () => new NotFoundError() })) size: PhotoSize,
    @Query() { shop, object, expires, signature }: PhotoFileQuery,
  ): Promise<StreamableFile> {
    const address = { shopId: shop, photoId, size, sha256: object };
    const now = { secret: this.env.URL_SIGNING_SECRET, nowS: Date.now() / 1000 };
    if (!isSignedPhotoUrl(address, { expires, signature }, now))
      throw new NotFoundError('This address of a photo is over or was never given out. Load the page again.');
    const { stream, bytes } = await this.open(keptObjectKey(shop, object));
    return new StreamableFile(stream, { type: 'image/jpeg', length: bytes, disposition: `inline; filename="photo-${size}.jpg"` });
  }

  private async open(key: string) {
    try {
      return await this.storage.get(key);
    } catch (error) {
      if (error instanceof ObjectMissingError) throw new NotFoundError();
      throw error;
    }
  }
}
