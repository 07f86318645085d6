import { ApiProperty } from '@nestjs/swagger';
import { ROLES, type Role } from '@proofplate/recipe-model';
import { PageOf } from '../../common/pagination/page';

export class InvitationDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty({ format: 'email' }) email: string;
  @ApiProperty({ enum: [...ROLES] }) role: Role;
  @ApiProperty({ enum: ['open', 'expired', 'accepted', 'revoked'] }) state: string;
  @ApiProperty({ description: 'Printed name of who invited' }) invitedBy: string;
  @ApiProperty({ format: 'date-time' }) createdAt: string;
  @ApiProperty({ format: 'date-time', description: 'The link works until then' }) expiresAt: string;
  @ApiProperty({ type: String, format: 'date-time', nullable: true }) acceptedAt: string | null;
  @ApiProperty({ type: [String], description: 'Acts that the caller may do now' }) allowedActions: string[];
}

export class InvitationPageDto extends PageOf(InvitationDto) {}
