import { ApiProperty } from '@nestjs/swagger';
import { ROLES, type Role } from '@proofplate/recipe-model';

export const SIGN_OFF_MEANINGS = ['submitted for review', 'recalled', 'approved', 'returned', 'withdrawn'] as const;
export type SignOffMeaning = (typeof SIGN_OFF_MEANINGS)[number];

/** Who said what of a revision, frozen as printed and bound to the content. */
export class SignOffDto {
  @ApiProperty({ description: 'Id of the signature', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Member who signed', format: 'uuid' }) memberId: string;
  @ApiProperty({ description: 'Name as printed when signing' }) printedName: string;
  @ApiProperty({ enum: ROLES, description: 'Role when signing' }) role: Role;
  @ApiProperty({ enum: SIGN_OFF_MEANINGS, description: 'What the signature means' }) meaning: SignOffMeaning;
  @ApiProperty({ description: 'Comment or reason; may be empty' }) comment: string;
  @ApiProperty({ format: 'date-time', description: 'When, by the server’s clock' }) signedAt: string;
  @ApiProperty({ description: 'SHA-256 of the content that was signed, hexadecimal' }) contentHash: string;
  @ApiProperty({ description: 'Hash of the ledger’s last event before the signature' }) ledgerHashBefore: string;
  @ApiProperty({ enum: ['password', 'session'], description: 'How the signer was confirmed' }) method: 'password' | 'session';
  @ApiProperty({
    description: 'true: signed by the author of the revision or somebody who edited its draft, which the shop’s policy allowed',
  })
  isByAuthor: boolean;
}
