import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsOptional, IsUUID } from 'class-validator';
import { PageOf, PageQuery } from '../../common/pagination/page';
import { NamedDto } from '../../coupons/dto/coupon.dto';

/** How far the source has moved under a setting since the reading that it was proved with. */
export class PowerShiftDto {
  @ApiProperty({ description: 'Place of the mark step that moved most, from 0' }) stepIndex: number;
  @ApiProperty({ description: 'Watts by the reading that the setting cites' }) beforeW: number;
  @ApiProperty({ description: 'Watts by the newest reading that holds for it' }) afterW: number;
  @ApiProperty({ description: 'Change in percent; below zero: the source gives less' }) shiftPercent: number;
  @ApiProperty({ format: 'date', description: 'Day of the reading that it cites' }) citedOn: string;
  @ApiProperty({ format: 'date', description: 'Day of the newest reading that holds for it' }) measuredOn: string;
  @ApiProperty({ description: 'Change that the shop’s policy allows, percent' }) limitPercent: number;
  @ApiProperty({ description: 'true: it moved by more than the policy allows' }) isCheckDue: boolean;
}

/** An approved setting and what a later reading says of it. */
export class RecipePowerShiftDto {
  @ApiProperty({ description: 'Id of the recipe', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Code of the recipe' }) code: string;
  @ApiProperty({ description: 'Title of the recipe' }) title: string;
  @ApiProperty({ description: 'Number of the approved revision' }) revisionNumber: number;
  @ApiProperty({ type: NamedDto, description: 'Machine' }) machine: NamedDto;
  @ApiProperty({ type: PowerShiftDto, nullable: true, description: 'null: there is nothing to compare' }) shift: PowerShiftDto | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why there is nothing to compare; null when there is' }) reason: string | null;
}

export class RecipePowerShiftPageDto extends PageOf(RecipePowerShiftDto) {}

export class ListPowerShiftsQuery extends PageQuery {
  @ApiPropertyOptional({ format: 'uuid', description: 'Only recipes of this machine' })
  @IsOptional()
  @IsUUID('all', { message: 'This does not name a machine.' })
  machineId?: string;
}
