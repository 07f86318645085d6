import { ApiProperty } from '@nestjs/swagger';

export class ApprovalCheckDto {
  @ApiProperty({ description: 'Key of the check' }) key: string;
  @ApiProperty({ description: 'true: it passes' }) passes: boolean;
  @ApiProperty({ description: 'What is checked' }) title: string;
  @ApiProperty({ description: 'What was found, and the way out where it fails' }) detail: string;
  @ApiProperty({ description: 'true: shown, but blocks nothing' }) isAdvisory: boolean;
  @ApiProperty({ enum: ['submit', 'approve'], description: 'The act that it blocks first' }) blocks: 'submit' | 'approve';
}

/** One measured quantity over the confirmation marks. */
export class ConfirmationSpreadDto {
  @ApiProperty({ description: 'What was measured' }) quantity: string;
  @ApiProperty({ description: 'The quantity in words' }) label: string;
  @ApiProperty({ description: 'Unit; 1: a pure number' }) unit: string;
  @ApiProperty({ description: 'Marks with this measurement' }) n: number;
  @ApiProperty({ description: 'Lowest value' }) lowest: number;
  @ApiProperty({ description: 'Highest value' }) highest: number;
  @ApiProperty({ description: 'Mean' }) mean: number;
}

export class ConfirmationDto {
  @ApiProperty({ description: 'Marks that count: later, the same setting, all criteria met' }) markCount: number;
  @ApiProperty({ description: 'Marks that the shop’s policy asks for' }) neededCount: number;
  @ApiProperty({ description: 'Marks that were cited or made but do not count' }) notCountingCount: number;
  @ApiProperty({ type: [String], description: 'Lots of the material that they cover; empty text: not recorded' }) lots: string[];
  @ApiProperty({ description: 'Days on which they were made' }) dayCount: number;
  @ApiProperty({ type: [ConfirmationSpreadDto], description: 'Measured quantities of the marks that count' })
  spreads: ConfirmationSpreadDto[];
}

export class ApprovalChecksDto {
  @ApiProperty({ type: [ApprovalCheckDto], description: 'Every check, failing ones first' }) items: ApprovalCheckDto[];
  @ApiProperty({ type: ConfirmationDto, description: 'The confirmation in numbers' }) confirmation: ConfirmationDto;
  @ApiProperty({ description: 'true: nothing that blocks submitting fails' }) maySubmit: boolean;
  @ApiProperty({ description: 'true: nothing that blocks the caller’s approval fails' }) mayApprove: boolean;
  @ApiProperty({ description: 'SHA-256 of the content that was checked, hexadecimal' }) contentHash: string;
}
