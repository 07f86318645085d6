import { ApiProperty, PartialType } from '@nestjs/swagger';
import { ArrayMaxSize, ArrayUnique, IsArray, IsUUID } from 'class-validator';
import { RequiredText } from '../../common/decorators/trimmed-text.decorator';
import { PageOf } from '../../common/pagination/page';
import { MAX_NAME_LENGTH } from './material.dto';

const MAX_GROUP_SIZE = 200;

export class CreateMaterialGroupDto {
  @ApiProperty({ description: 'Name of the group; unique in the shop', maxLength: MAX_NAME_LENGTH })
  @RequiredText(MAX_NAME_LENGTH, 'Name the group.')
  name: string;

  @ApiProperty({ type: [String], description: 'Materials of the shop that one approval may cover together' })
  @IsArray()
  @ArrayMaxSize(MAX_GROUP_SIZE)
  @ArrayUnique({ message: 'A material is in the group twice.' })
  @IsUUID('all', { each: true, message: 'Choose materials of the shop.' })
  materialIds: string[];
}

/** Only what is given changes; a given list replaces the earlier one. */
export class UpdateMaterialGroupDto extends PartialType(CreateMaterialGroupDto) {}

export class GroupedMaterialDto {
  @ApiProperty({ description: 'Id of the material', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name of the material' }) name: string;
}

export class MaterialGroupDto {
  @ApiProperty({ description: 'Id of the group', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name in the shop' }) name: string;
  @ApiProperty({ type: [GroupedMaterialDto], description: 'Materials of the group, by name' }) materials: GroupedMaterialDto[];
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: edit' }) allowedActions: string[];
}

export class MaterialGroupPageDto extends PageOf(MaterialGroupDto) {}
