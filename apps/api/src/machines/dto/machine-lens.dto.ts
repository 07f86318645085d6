import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsOptional, IsUUID } from 'class-validator';
import { HasBegun, IsDay } from '../../common/decorators/is-day';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';

const MAX_FOCUS_METHOD_LENGTH = 300;
const MAX_SPOT_METHOD_LENGTH = 200;

/** Changes of a lens on a machine. Null forgets a value. */
export class UpdateMachineLensDto {
  @ApiPropertyOptional({ type: Number, nullable: true, description: 'Distance from the lens to the work at focus, mm' })
  @IsOptional()
  @NumberBetween(1, 3000, { what: 'The working distance', unit: 'mm' })
  workingDistanceMm?: number | null;

  @ApiPropertyOptional({ description: 'How focus is found on this machine with this lens', maxLength: MAX_FOCUS_METHOD_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_FOCUS_METHOD_LENGTH)
  focusMethod?: string;

  @ApiPropertyOptional({ type: Number, nullable: true, description: 'Spot diameter (1/e²) that somebody measured, µm' })
  @IsOptional()
  @NumberBetween(0.5, 5000, { what: 'The measured spot', unit: 'µm' })
  measuredSpotUm?: number | null;

  @ApiPropertyOptional({ type: String, nullable: true, description: 'How the spot was measured', maxLength: MAX_SPOT_METHOD_LENGTH })
  @IsOptional()
  @TrimmedText(MAX_SPOT_METHOD_LENGTH)
  spotMethod?: string | null;

  @ApiPropertyOptional({ type: String, nullable: true, format: 'date', description: 'Day of that measurement' })
  @IsOptional()
  @IsDay()
  @HasBegun()
  spotMeasuredOn?: string | null;
}

export class CreateMachineLensDto extends UpdateMachineLensDto {
  @ApiProperty({ description: 'Lens of the shop', format: 'uuid' })
  @IsUUID('all', { message: 'Choose a lens of the shop.' })
  lensId: string;
}

export class MachineLensDto {
  @ApiProperty({ description: 'Id of the pair', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Id of the machine', format: 'uuid' }) machineId: string;
  @ApiProperty({ description: 'Id of the lens', format: 'uuid' }) lensId: string;
  @ApiProperty({ description: 'Name of the lens' }) lensName: string;
  @ApiProperty({ description: 'Focal length of the lens, mm' }) focalLengthMm: number;
  @ApiProperty({ description: 'Side of the marking field of the lens, mm' }) fieldSizeMm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Distance from the lens to the work at focus, mm' }) workingDistanceMm:
    | number
    | null;
  @ApiProperty({ description: 'How focus is found; empty: not entered' }) focusMethod: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Measured spot diameter (1/e²), µm' }) measuredSpotUm: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'How the spot was measured' }) spotMethod: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date', description: 'Day of that measurement' }) spotMeasuredOn: string | null;
  @ApiProperty({ description: 'true: this lens is mounted now' }) isMounted: boolean;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: edit' }) allowedActions: string[];
}

export class MachineLensListDto {
  @ApiProperty({ type: [MachineLensDto], description: 'Lenses of the machine, by name' }) items: MachineLensDto[];
  @ApiProperty({ type: String, nullable: true, description: 'Always null: the list is whole' }) nextCursor: string | null;
}
