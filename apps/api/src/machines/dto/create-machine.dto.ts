import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { IsDefined, IsInt, IsOptional, IsUUID, Max, Min, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { PanelDto } from './panel.dto';
import { PhysicalProfileDto } from './physical-profile.dto';

export const MAX_MACHINE_NAME_LENGTH = 80;
const MAX_SERIAL_LENGTH = 80;
const MAX_WARM_UP_MINUTES = 480;
const WARM_UP_MESSAGE = `The warm-up must be a whole number of minutes from 0 to ${MAX_WARM_UP_MINUTES}.`;

export class CreateMachineDto {
  @ApiProperty({ description: 'Name as people on the floor call the machine; unique in the shop', maxLength: MAX_MACHINE_NAME_LENGTH })
  @RequiredText(MAX_MACHINE_NAME_LENGTH, 'Give the machine the name that people on the floor use.')
  name: string;

  @ApiPropertyOptional({ description: 'Serial number from the type plate', maxLength: MAX_SERIAL_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_SERIAL_LENGTH)
  serialNumber?: string;

  @ApiPropertyOptional({ description: 'Warm-up before marking, minutes' })
  @MayBeAbsent()
  @IsInt({ message: WARM_UP_MESSAGE })
  @Min(0, { message: WARM_UP_MESSAGE })
  @Max(MAX_WARM_UP_MINUTES, { message: WARM_UP_MESSAGE })
  warmUpMinutes?: number;

  @ApiPropertyOptional({ type: String, nullable: true, format: 'uuid', description: 'Lens that is mounted now; null: none' })
  @IsOptional()
  @IsUUID('all', { message: 'Choose a lens of the shop.' })
  mountedLensId?: string | null;

  @ApiProperty({ type: PhysicalProfileDto, description: 'What the source and the scan head are' })
  @IsDefined()
  @ValidateNested()
  @Type(() => PhysicalProfileDto)
  physical: PhysicalProfileDto;

  @ApiProperty({ type: PanelDto, description: 'What the machine’s control shows' })
  @IsDefined()
  @ValidateNested()
  @Type(() => PanelDto)
  panel: PanelDto;
}
