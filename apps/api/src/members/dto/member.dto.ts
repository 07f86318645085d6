import { ApiProperty } from '@nestjs/swagger';
import { ROLES, type Role } from '@proofplate/recipe-model';
import { PageOf } from '../../common/pagination/page';

export class MemberDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name as it stands under signatures' }) printedName: string;
  @ApiProperty({ type: String, nullable: true, description: 'Address of a person who is in the shop; null for a removed member' }) email:
    | string
    | null;
  @ApiProperty({ enum: [...ROLES] }) role: Role;
  @ApiProperty({ enum: ['active', 'removed'] }) state: string;
  @ApiProperty({ format: 'date-time' }) createdAt: string;
  @ApiProperty({ type: String, format: 'date-time', nullable: true }) removedAt: string | null;
  @ApiProperty({ description: 'Version for If-Match' }) version: number;
  @ApiProperty({ type: [String], description: 'Acts that the caller may do now' }) allowedActions: string[];
}

export class MemberPageDto extends PageOf(MemberDto) {}
