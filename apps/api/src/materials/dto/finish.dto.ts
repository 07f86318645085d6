import { ApiProperty, ApiPropertyOptional, PartialType } from '@nestjs/swagger';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { PageOf } from '../../common/pagination/page';
import { MAX_NAME_LENGTH } from './material.dto';

const MAX_STEPS_LENGTH = 500;

export class CreateFinishDto {
  @ApiProperty({ description: 'Name of the finish; unique in the shop', maxLength: MAX_NAME_LENGTH })
  @RequiredText(MAX_NAME_LENGTH, 'Name the finish, such as brushed or black anodised.')
  name: string;

  @ApiPropertyOptional({
    description: 'Preparation before marking: cleaned, degreased, passivated, oiled; grain direction',
    maxLength: MAX_STEPS_LENGTH,
  })
  @MayBeAbsent()
  @TrimmedText(MAX_STEPS_LENGTH)
  preparation?: string;

  @ApiPropertyOptional({ description: 'Treatment after marking: wipe, brush, passivate, seal', maxLength: MAX_STEPS_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_STEPS_LENGTH)
  treatment?: string;
}

/** Only what is given changes. */
export class UpdateFinishDto extends PartialType(CreateFinishDto) {}

export class FinishDto {
  @ApiProperty({ description: 'Id of the finish', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name in the shop' }) name: string;
  @ApiProperty({ description: 'Preparation before marking; empty: none' }) preparation: string;
  @ApiProperty({ description: 'Treatment after marking; empty: none' }) treatment: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was archived; null: in use' })
  archivedAt: string | null;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: edit, archive, restore' }) allowedActions: string[];
}

export class FinishPageDto extends PageOf(FinishDto) {}
