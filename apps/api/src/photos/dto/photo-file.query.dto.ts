import { ApiProperty } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { IsInt, IsUUID, Length, Matches, Max, Min } from 'class-validator';

/** The signed part of a photo's address; made by the server, only sent back. */
export class PhotoFileQuery {
  @ApiProperty({ description: 'Shop of the photo', format: 'uuid' }) @IsUUID() shop: string;
  @ApiProperty({ description: 'SHA-256 of the stored picture' }) @Matches(/^[0-9a-f]{64}$/) object: string;
  @ApiProperty({ description: 'End of the address’s life, Unix seconds' })
  @Type(() => Number)
  @IsInt()
  @Min(1)
  @Max(9_999_999_999)
  expires: number;
  @ApiProperty({ description: 'Signature over all of it' }) @Length(43, 43) signature: string;
}
