import { ApiProperty } from '@nestjs/swagger';
import { PageOf } from '../../common/pagination/page';

export class LensDto {
  @ApiProperty({ description: 'Id of the lens', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name in the shop' }) name: string;
  @ApiProperty({ description: 'Focal length, mm' }) focalLengthMm: number;
  @ApiProperty({ description: 'Side of the square marking field, mm' }) fieldSizeMm: number;
  @ApiProperty({ description: 'Notes of the shop' }) notes: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was archived; null: in use' })
  archivedAt: string | null;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do with it: edit, archive, restore' }) allowedActions: string[];
}

export class LensPageDto extends PageOf(LensDto) {}
