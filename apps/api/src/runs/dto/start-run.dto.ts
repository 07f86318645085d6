import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { RUN_KINDS, type RunKind } from '@proofplate/recipe-model';
import { ArrayMaxSize, ArrayUnique, IsArray, IsIn, IsUUID, Matches } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';

const MAX_REFERENCE_LENGTH = 80;
const MOST_TICKS = 300;
const TICK = /^(?:set-up\.\d{1,3}|setting\.\d{1,2}\.[A-Za-z]{1,40})$/u;

export class StartRunDto {
  @ApiProperty({ description: 'Made by the device, so that a run sent twice is one run', format: 'uuid' })
  @IsUUID('all', { message: 'Send a client id of the device.' })
  clientId: string;

  @ApiProperty({ enum: RUN_KINDS, enumName: 'RunKind', description: 'Kind of run' })
  @IsIn(RUN_KINDS, { message: 'Choose the kind of run.' })
  kind: RunKind;

  @ApiProperty({ description: 'Revision that is dialled in', format: 'uuid' })
  @IsUUID('all', { message: 'Choose the setting at the machine again.' })
  revisionId: string;

  @ApiProperty({ description: 'Lens that is fitted', format: 'uuid' })
  @IsUUID('all', { message: 'Say which lens is fitted.' })
  lensFittedId: string;

  @ApiProperty({ type: [String], description: 'What is done: “set-up.<place>” and “setting.<step>.<parameter>”' })
  @IsArray()
  @ArrayMaxSize(MOST_TICKS)
  @ArrayUnique()
  @Matches(TICK, { each: true, message: 'Tick steps of this setting only.' })
  ticks: string[];

  @ApiPropertyOptional({ description: 'Job, as the shop calls it', maxLength: MAX_REFERENCE_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_REFERENCE_LENGTH)
  jobReference: string = '';

  @ApiPropertyOptional({ description: 'Part', maxLength: MAX_REFERENCE_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_REFERENCE_LENGTH)
  part: string = '';

  @ApiPropertyOptional({ description: 'Lot of the material', maxLength: MAX_REFERENCE_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_REFERENCE_LENGTH)
  lot: string = '';

  @ApiPropertyOptional({ description: 'Deviation that the run cites', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a deviation.' })
  deviationId?: string;
}

export class TickRunDto {
  @ApiProperty({ type: [String], description: 'What is done now' })
  @IsArray()
  @ArrayMaxSize(MOST_TICKS)
  @ArrayUnique()
  @Matches(TICK, { each: true, message: 'Tick steps of this setting only.' })
  tick: string[];

  @ApiProperty({ type: [String], description: 'What was ticked and is not done' })
  @IsArray()
  @ArrayMaxSize(MOST_TICKS)
  @ArrayUnique()
  @Matches(TICK, { each: true, message: 'Untick steps of this setting only.' })
  untick: string[];
}
