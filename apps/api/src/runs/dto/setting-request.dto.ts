import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsIn, IsOptional, IsUUID } from 'class-validator';
import { IsDay } from '../../common/decorators/is-day';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { PageOf, PageQuery } from '../../common/pagination/page';
import { NamedDto } from '../../coupons/dto/coupon.dto';

const MAX_NOTE_LENGTH = 1000;
const MAX_REFERENCE_LENGTH = 80;
export const REQUEST_STATES = ['open', 'answered', 'closed'] as const;
export type RequestState = (typeof REQUEST_STATES)[number];

export class AskForSettingDto {
  @ApiPropertyOptional({ description: 'Machine', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a machine.' })
  machineId?: string;

  @ApiPropertyOptional({ description: 'Lens', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a lens.' })
  lensId?: string;

  @ApiProperty({ description: 'Material', format: 'uuid' })
  @IsUUID('all', { message: 'Choose the material first.' })
  materialId: string;

  @ApiPropertyOptional({ description: 'Finish', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a finish.' })
  finishId?: string;

  @ApiPropertyOptional({ description: 'Effect', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name an effect.' })
  effectId?: string;

  @ApiPropertyOptional({ description: 'Job that it is for', maxLength: MAX_REFERENCE_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_REFERENCE_LENGTH)
  jobReference: string = '';

  @ApiPropertyOptional({ format: 'date', description: 'Day when it is needed' })
  @MayBeAbsent()
  @IsDay()
  neededOn?: string;

  @ApiPropertyOptional({ description: 'Remark', maxLength: MAX_NOTE_LENGTH, default: '' })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTE_LENGTH)
  note: string = '';
}

export class AnswerRequestDto {
  @ApiProperty({ description: 'What became of it', maxLength: MAX_NOTE_LENGTH })
  @RequiredText(MAX_NOTE_LENGTH, 'Say what became of it: the recipe, or why there will be none.')
  answer: string;

  @ApiProperty({ enum: ['answered', 'closed'], description: 'answered: there is a setting; closed: there will be none' })
  @IsIn(['answered', 'closed'], { message: 'Choose answered or closed.' })
  state: 'answered' | 'closed';
}

export class ListRequestsQuery extends PageQuery {
  @ApiPropertyOptional({ enum: REQUEST_STATES, description: 'Only requests in this state' })
  @IsOptional()
  @IsIn(REQUEST_STATES, { message: 'This is no state of a request.' })
  state?: RequestState;
}

export class SettingRequestDto {
  @ApiProperty({ description: 'Id of the request', format: 'uuid' }) id: string;
  @ApiProperty({ enum: REQUEST_STATES, description: 'Where it stands' }) state: RequestState;
  @ApiProperty({ type: NamedDto, nullable: true, description: 'Machine; null: any' }) machine: NamedDto | null;
  @ApiProperty({ type: NamedDto, nullable: true, description: 'Lens; null: any' }) lens: NamedDto | null;
  @ApiProperty({ type: NamedDto, nullable: true, description: 'Material' }) material: NamedDto | null;
  @ApiProperty({ type: NamedDto, nullable: true, description: 'Finish; null: any' }) finish: NamedDto | null;
  @ApiProperty({ type: NamedDto, nullable: true, description: 'Effect; null: any' }) effect: NamedDto | null;
  @ApiProperty({ description: 'Job that it is for; may be empty' }) jobReference: string;
  @ApiProperty({ type: String, nullable: true, format: 'date', description: 'Day when it is needed; null: not said' }) neededOn:
    | string
    | null;
  @ApiProperty({ description: 'Remark; may be empty' }) note: string;
  @ApiProperty({ description: 'Who asks' }) askedBy: string;
  @ApiProperty({ format: 'date-time', description: 'When' }) askedAt: string;
  @ApiProperty({ type: String, nullable: true, description: 'What became of it; null: open' }) answer: string | null;
  @ApiProperty({ type: String, nullable: true, description: 'Who answered' }) answeredBy: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was answered' }) answeredAt: string | null;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: answer' }) allowedActions: string[];
}

export class SettingRequestPageDto extends PageOf(SettingRequestDto) {}
