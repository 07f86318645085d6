import { ApiProperty } from '@nestjs/swagger';
import { PageOf } from '../../common/pagination/page';

export class LedgerEventDto {
  @ApiProperty({ description: 'Number of the event in its shop, without gaps' }) seq: number;
  @ApiProperty({ format: 'date-time', description: 'Time of the database' }) at: string;
  @ApiProperty({ type: String, format: 'uuid', nullable: true, description: 'Member who acted; null: the server' }) actorMemberId:
    | string
    | null;
  @ApiProperty({ description: 'Printed name at that moment' }) actorName: string;
  @ApiProperty({ description: 'What happened, such as recipe.submitted' }) action: string;
  @ApiProperty({ description: 'Kind of thing it happened to' }) subjectType: string;
  @ApiProperty({ format: 'uuid' }) subjectId: string;
  @ApiProperty({ type: String, nullable: true, description: 'Code that people read, such as R-0001' }) subjectCode: string | null;
  @ApiProperty({ nullable: true, type: 'object', additionalProperties: true, description: 'Values before' }) before: unknown;
  @ApiProperty({ nullable: true, type: 'object', additionalProperties: true, description: 'Values after' }) after: unknown;
  @ApiProperty({ description: 'Hash of the event before, hexadecimal SHA-256' }) previousHash: string;
  @ApiProperty({ description: 'SHA-256(previousHash ‖ seq ‖ canonical body), hexadecimal' }) hash: string;
}

export class LedgerActorDto {
  @ApiProperty({ format: 'uuid' }) memberId: string;
  @ApiProperty({ description: 'Present printed name' }) name: string;
  @ApiProperty({ description: 'False for somebody who has left the shop' }) isActive: boolean;
}

export class LedgerActorsDto {
  @ApiProperty({ type: [LedgerActorDto], description: 'Everybody who is or was in the shop, by name' }) items: LedgerActorDto[];
}

export class LedgerPageDto extends PageOf(LedgerEventDto) {}

export class LedgerVerificationDto {
  @ApiProperty({ description: 'True when every event fits the one before it and its own content' }) isIntact: boolean;
  @ApiProperty({ description: 'Number of events' }) eventCount: number;
  @ApiProperty({ description: 'Hash of the last event' }) headHash: string;
  @ApiProperty({ type: Number, nullable: true, description: 'First event that does not fit' }) firstBrokenSeq: number | null;
  @ApiProperty({ type: String, nullable: true, enum: ['number missing', 'link broken', 'content changed'] }) reason: string | null;
}
