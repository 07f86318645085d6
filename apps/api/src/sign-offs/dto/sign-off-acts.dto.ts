import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { ArrayMaxSize, IsArray, IsNotEmpty, IsString, IsUUID, Matches, MaxLength } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';

const MAX_COMMENT_LENGTH = 2000;
const MAX_PASSWORD_LENGTH = 1000;
const MAX_CAUTIONS = 100;
const SHA_256 = /^[0-9a-f]{64}$/;

export class SubmitRevisionDto {
  @ApiProperty({ type: [String], description: 'Cautions that the author acknowledges' })
  @IsArray()
  @ArrayMaxSize(MAX_CAUTIONS)
  @IsUUID('all', { each: true, message: 'Choose cautions of the list.' })
  acknowledgedCautionIds: string[];

  @ApiPropertyOptional({ description: 'A word to the lead', maxLength: MAX_COMMENT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_COMMENT_LENGTH)
  comment?: string;
}

export class RecallRevisionDto {
  @ApiPropertyOptional({ description: 'Why', maxLength: MAX_COMMENT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_COMMENT_LENGTH)
  comment?: string;
}

export class ReturnRevisionDto {
  @ApiProperty({ description: 'What the author should do', maxLength: MAX_COMMENT_LENGTH })
  @RequiredText(MAX_COMMENT_LENGTH, 'Say what the author should do.')
  comment: string;
}

export class ApproveRevisionDto {
  @ApiProperty({ description: 'Password of the person who signs', maxLength: MAX_PASSWORD_LENGTH })
  @IsString()
  @IsNotEmpty({ message: 'Type your password to sign.' })
  @MaxLength(MAX_PASSWORD_LENGTH)
  password: string;

  @ApiProperty({ description: 'contentHash of the revision as it was shown' })
  @Matches(SHA_256, { message: 'Send the content hash of the revision that was shown.' })
  contentHash: string;

  @ApiProperty({ type: [String], description: 'Cautions that the signer acknowledges' })
  @IsArray()
  @ArrayMaxSize(MAX_CAUTIONS)
  @IsUUID('all', { each: true, message: 'Choose cautions of the list.' })
  acknowledgedCautionIds: string[];

  @ApiPropertyOptional({ description: 'Comment', maxLength: MAX_COMMENT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_COMMENT_LENGTH)
  comment?: string;
}

export class WithdrawRevisionDto {
  @ApiProperty({ description: 'Password of the person who signs', maxLength: MAX_PASSWORD_LENGTH })
  @IsString()
  @IsNotEmpty({ message: 'Type your password to sign.' })
  @MaxLength(MAX_PASSWORD_LENGTH)
  password: string;

  @ApiProperty({ description: 'Why it must not be used any more', maxLength: MAX_COMMENT_LENGTH })
  @RequiredText(MAX_COMMENT_LENGTH, 'Say why it must not be used any more.')
  reason: string;
}
