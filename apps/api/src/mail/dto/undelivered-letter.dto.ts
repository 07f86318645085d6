import { ApiProperty } from '@nestjs/swagger';

export class UndeliveredLetterDto {
  @ApiProperty({ format: 'uuid' }) id: string;
  @ApiProperty({ description: 'What it was about, such as invitation or revision-approved' }) kind: string;
  @ApiProperty({ description: 'Address it was meant for' }) address: string;
  @ApiProperty({ description: 'Last answer of the mail server, or why it was given up' }) reason: string;
  @ApiProperty({ format: 'date-time', description: 'When it was written' }) writtenAt: string;
}

export class UndeliveredLetterListDto {
  @ApiProperty({ type: [UndeliveredLetterDto], description: 'The newest first, at most a hundred' }) items: UndeliveredLetterDto[];
}
