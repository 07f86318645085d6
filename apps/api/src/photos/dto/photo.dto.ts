import { ApiProperty } from '@nestjs/swagger';
import { PageOf } from '../../common/pagination/page';

export class CornerDto {
  @ApiProperty({ description: 'Fraction of the width of the upright picture, from the left', minimum: 0, maximum: 1 }) x: number;
  @ApiProperty({ description: 'Fraction of the height of the upright picture, from the top', minimum: 0, maximum: 1 }) y: number;
}

export class PhotoUrlsDto {
  @ApiProperty({ description: 'Path of the full picture; signed, opens it for a few minutes' }) master: string;
  @ApiProperty({ description: 'Path of the picture with at most 1600 pixels per side; signed, opens it for a few minutes' }) large: string;
  @ApiProperty({ description: 'Path of the picture with at most 400 pixels per side; signed, opens it for a few minutes' }) small: string;
}

/** As much of a photo as is needed to lay it under the cells. */
export class PlatePhotoDto {
  @ApiProperty({ description: 'Id of the photo', format: 'uuid' }) id: string;
  @ApiProperty({ type: PhotoUrlsDto, nullable: true, description: 'Addresses for <img>' }) urls: PhotoUrlsDto | null;
  @ApiProperty({ type: [CornerDto], nullable: true, description: 'Corners of the plate, clockwise from the origin mark' })
  corners: CornerDto[] | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Width, pixels' }) widthPx: number | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Height, pixels' }) heightPx: number | null;
}

export class PhotoDto {
  @ApiProperty({ description: 'Id of the photo', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Coupon that it shows', format: 'uuid' }) couponId: string;
  @ApiProperty({ enum: ['uploading', 'processing', 'ready', 'refused'], description: 'Where it is on its way' }) state: string;
  @ApiProperty({ type: String, nullable: true, description: 'Why it was refused and what to do; null otherwise' }) refusedReason:
    | string
    | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Width of the upright picture, pixels; null until ready' }) widthPx:
    | number
    | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Height of the upright picture, pixels; null until ready' }) heightPx:
    | number
    | null;
  @ApiProperty({
    type: String,
    nullable: true,
    format: 'date-time',
    description: 'Time of exposure by the camera’s clock, read in the shop’s time zone',
  })
  capturedAt: string | null;
  @ApiProperty({
    type: String,
    nullable: true,
    description: 'Colour profile that was converted to sRGB; null: none embedded, taken as sRGB',
  })
  colourProfile: string | null;
  @ApiProperty({ type: [CornerDto], nullable: true, description: 'Corners of the plate, clockwise from the origin mark; null until found' })
  corners: CornerDto[] | null;
  @ApiProperty({ type: String, nullable: true, enum: ['hand', 'marks', 'render', null], description: 'How the corners were found' })
  cornersFoundBy: string | null;
  @ApiProperty({ description: 'Notes on the light' }) lightNotes: string;
  @ApiProperty({ type: [String], description: 'Remarks on the quality of the photo' }) flags: string[];
  @ApiProperty({ description: 'SHA-256 of the bytes that were sent' }) receivedSha256: string;
  @ApiProperty({ type: String, nullable: true, description: 'SHA-256 of the stored picture, the one that is measured; null until ready' })
  masterSha256: string | null;
  @ApiProperty({ type: PhotoUrlsDto, nullable: true, description: 'Addresses for <img>; null until ready' }) urls: PhotoUrlsDto | null;
  @ApiProperty({ description: 'When it was sent', format: 'date-time' }) createdAt: string;
  @ApiProperty({ description: 'Member who sent it', format: 'uuid' }) createdBy: string;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do with it: set-corners, retry' }) allowedActions: string[];
}

export class PhotoPageDto extends PageOf(PhotoDto) {}
