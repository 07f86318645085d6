import { ApiProperty } from '@nestjs/swagger';
import { ROLES, type Role, SOURCE_KINDS, type SourceKind } from '@proofplate/recipe-model';
import { PageOf } from '../../common/pagination/page';

export class SigningProcessDto {
  @ApiProperty({ format: 'uuid' }) effectId: string;
  @ApiProperty({ description: 'Name of the effect' }) effectName: string;
  @ApiProperty({ enum: [...SOURCE_KINDS], description: 'Kind of laser source' }) sourceKind: SourceKind;
}

export class MemberDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name as it stands under signatures' }) printedName: string;
  @ApiProperty({ type: String, nullable: true, description: 'Address of a person who is in the shop; null for a removed member' }) email:
    | string
    | null;
  @ApiProperty({ enum: [...ROLES] }) role: Role;
  @ApiProperty({
    type: [SigningProcessDto],
    nullable: true,
    description: 'Processes that a lead or owner signs for, an effect on a kind of source each; null: all of them',
  })
  signsFor: SigningProcessDto[] | null;
  @ApiProperty({ enum: ['active', 'removed'] }) state: string;
  @ApiProperty({ format: 'date-time' }) createdAt: string;
  @ApiProperty({ type: String, format: 'date-time', nullable: true }) removedAt: string | null;
  @ApiProperty({ description: 'Version for If-Match' }) version: number;
  @ApiProperty({ type: [String], description: 'Acts that the caller may do now' }) allowedActions: string[];
}

export class MemberPageDto extends PageOf(MemberDto) {}
