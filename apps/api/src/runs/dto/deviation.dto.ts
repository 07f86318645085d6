import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsInt, IsOptional, IsUUID, Max, Min } from 'class-validator';
import { IsMoment } from '../../common/decorators/is-moment';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText } from '../../common/decorators/trimmed-text.decorator';
import { PageOf, PageQuery } from '../../common/pagination/page';

const MAX_TEXT_LENGTH = 1000;
const MOST_PARTS = 100_000;
const QUANTITY_MESSAGE = `The number of parts must be a whole number from 1 to ${MOST_PARTS}.`;

export class GrantDeviationDto {
  @ApiProperty({ description: 'Approved revision that may be departed from', format: 'uuid' })
  @IsUUID('all', { message: 'Choose the revision.' })
  revisionId: string;

  @ApiProperty({ description: 'What may differ', maxLength: MAX_TEXT_LENGTH })
  @RequiredText(MAX_TEXT_LENGTH, 'Say what may differ and by how much.')
  description: string;

  @ApiProperty({ description: 'Why', maxLength: MAX_TEXT_LENGTH })
  @RequiredText(MAX_TEXT_LENGTH, 'Say why.')
  reason: string;

  @ApiPropertyOptional({ format: 'date-time', description: 'Ends by itself at this time' })
  @MayBeAbsent()
  @IsMoment()
  endsAt?: string;

  @ApiPropertyOptional({ description: 'Ends by itself after so many parts, good and scrapped' })
  @MayBeAbsent()
  @IsInt({ message: QUANTITY_MESSAGE })
  @Min(1, { message: QUANTITY_MESSAGE })
  @Max(MOST_PARTS, { message: QUANTITY_MESSAGE })
  maximumQuantity?: number;
}

export class DeviationDto {
  @ApiProperty({ description: 'Id of the deviation', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Revision that may be departed from', format: 'uuid' }) revisionId: string;
  @ApiProperty({ description: 'What may differ' }) description: string;
  @ApiProperty({ description: 'Why' }) reason: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'Ends at this time; null: by quantity only' })
  endsAt: string | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Ends after so many parts; null: by time only' }) maximumQuantity:
    | number
    | null;
  @ApiProperty({ description: 'Parts marked under it so far, good and scrapped' }) usedQuantity: number;
  @ApiProperty({ description: 'true: a run may cite it now' }) isLive: boolean;
  @ApiProperty({ description: 'Who granted it' }) grantedBy: string;
  @ApiProperty({ format: 'date-time', description: 'When' }) grantedAt: string;
}

export class DeviationPageDto extends PageOf(DeviationDto) {}

export class ListDeviationsQuery extends PageQuery {
  @ApiPropertyOptional({ format: 'uuid', description: 'Only of this revision' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a revision.' })
  revisionId?: string;
}
