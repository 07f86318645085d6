import { ApiProperty } from '@nestjs/swagger';
import type { CautionLevel } from '@proofplate/recipe-model';

/** The revision of a run under way is not to be marked with any more. */
export class RunStopDto {
  @ApiProperty({ enum: ['withdrawn', 'superseded'], description: 'What became of the revision' }) because: 'withdrawn' | 'superseded';
  @ApiProperty({ type: String, nullable: true, description: 'Who withdrew it; null: a newer revision took its place' }) by: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was withdrawn' }) at: string | null;
  @ApiProperty({ description: 'Why it was withdrawn; may be empty' }) reason: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Number of the revision that is approved now; null: none' })
  approvedNumber: number | null;
}

export class RunCautionDto {
  @ApiProperty({ description: 'Id of the caution', format: 'uuid' }) id: string;
  @ApiProperty({ enum: ['never', 'care'], description: 'never: it must not be marked' }) level: CautionLevel;
  @ApiProperty({ description: 'What to do, first' }) subject: string;
  @ApiProperty({ description: 'Why' }) text: string;
  @ApiProperty({ description: 'Where it comes from' }) source: string;
  @ApiProperty({ description: 'true: it holds for all work, not for this one in particular' }) isGeneral: boolean;
}
