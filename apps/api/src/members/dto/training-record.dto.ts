import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { IsDay } from '../../common/decorators/is-day';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText } from '../../common/decorators/trimmed-text.decorator';

const MAX_SUBJECT_LENGTH = 200;
const MAX_TEACHER_LENGTH = 120;

export class CreateTrainingRecordDto {
  @ApiProperty({ maxLength: MAX_SUBJECT_LENGTH, description: 'What was taught, in the words of the shop' })
  @RequiredText(MAX_SUBJECT_LENGTH, 'Say what was taught.')
  subject: string;

  @ApiProperty({ maxLength: MAX_TEACHER_LENGTH, description: 'Who taught it; not always somebody of the shop' })
  @RequiredText(MAX_TEACHER_LENGTH, 'Say who taught it.')
  taughtBy: string;

  @ApiProperty({ format: 'date', description: 'Day of the training' })
  @IsDay()
  taughtOn: string;

  @ApiPropertyOptional({ format: 'date', description: 'Last day on which it counts; absent: it does not run out' })
  @MayBeAbsent()
  @IsDay()
  expiresOn?: string;
}

export class TrainingRecordDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty({ description: 'What was taught' }) subject: string;
  @ApiProperty({ description: 'Who taught it' }) taughtBy: string;
  @ApiProperty({ format: 'date' }) taughtOn: string;
  @ApiProperty({ type: String, format: 'date', nullable: true, description: 'Last day on which it counts' }) expiresOn: string | null;
  @ApiProperty({ description: 'True when that day is over in the shop' }) isExpired: boolean;
  @ApiProperty({ description: 'Printed name of whoever wrote it down' }) recordedBy: string;
  @ApiProperty({ format: 'date-time' }) recordedAt: string;
}

export class TrainingRecordListDto {
  @ApiProperty({ type: [TrainingRecordDto], description: 'The latest training first' }) items: TrainingRecordDto[];
}
