import { ApiProperty } from '@nestjs/swagger';
import { PanelDto } from './panel.dto';
import { PhysicalProfileDto } from './physical-profile.dto';

export class MachineProfileDto {
  @ApiProperty({ description: 'Id of this version of the profile', format: 'uuid' }) id: string;
  @ApiProperty({ description: '1, 2, 3 … of the machine' }) number: number;
  @ApiProperty({ description: 'Rises only when the physical part changed; evidence holds within one physical number' })
  physicalNumber: number;
  @ApiProperty({ type: PhysicalProfileDto, description: 'What the source and the scan head are' }) physical: PhysicalProfileDto;
  @ApiProperty({ type: PanelDto, description: 'What the machine’s control shows' }) panel: PanelDto;
  @ApiProperty({ description: 'When it was entered', format: 'date-time' }) createdAt: string;
  @ApiProperty({ description: 'Who entered it' }) createdByName: string;
}

export class MachineProfileListDto {
  @ApiProperty({ type: [MachineProfileDto], description: 'All versions of the profile, newest first' }) items: MachineProfileDto[];
  @ApiProperty({ type: String, nullable: true, description: 'Always null: the list is whole' }) nextCursor: string | null;
}
