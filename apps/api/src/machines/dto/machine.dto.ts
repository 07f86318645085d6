import { ApiProperty } from '@nestjs/swagger';
import { SOURCE_KINDS, type SourceKind } from '@proofplate/recipe-model';
import { PageOf } from '../../common/pagination/page';
import { MachineProfileDto } from './machine-profile.dto';

export class MountedLensDto {
  @ApiProperty({ description: 'Id of the lens', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name of the lens' }) name: string;
}

export class MachineDto {
  @ApiProperty({ description: 'Id of the machine', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name in the shop' }) name: string;
  @ApiProperty({ enum: SOURCE_KINDS, description: 'Kind of laser source' }) sourceKind: SourceKind;
  @ApiProperty({ description: 'Serial number from the type plate; empty: not entered' }) serialNumber: string;
  @ApiProperty({ description: 'Warm-up before marking, minutes' }) warmUpMinutes: number;
  @ApiProperty({ type: MountedLensDto, nullable: true, description: 'Lens that is mounted now; null: none' })
  mountedLens: MountedLensDto | null;
  @ApiProperty({ type: MachineProfileDto, description: 'The profile in force' }) profile: MachineProfileDto;
  @ApiProperty({ type: String, nullable: true, format: 'date', description: 'Day of the newest power calibration; null: none' })
  latestCalibrationOn: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was archived; null: in use' })
  archivedAt: string | null;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: edit, archive, restore, add-lens, add-calibration' })
  allowedActions: string[];
}

export class MachinePageDto extends PageOf(MachineDto) {}
