import { ApiProperty } from '@nestjs/swagger';
import {
  codesOf,
  OUTCOMES,
  type Outcome,
  REVISION_STATE_LABELS,
  type RevisionState,
  RUN_KINDS,
  type RunKind,
} from '@proofplate/recipe-model';
import { PageOf } from '../../common/pagination/page';
import { NamedDto } from '../../coupons/dto/coupon.dto';
import { PanelDto } from '../../machines/dto/panel.dto';
import { DerivedNumberDto, StepNumbersDto } from '../../recipes/dto/derived-number.dto';
import { MarkStepDto, SetUpStepDto } from '../../recipes/dto/mark-step.dto';
import { RunCautionDto, RunStopDto } from './run-surroundings.dto';

export const RUN_STATES = ['started', 'finished', 'abandoned'] as const;
export type RunState = (typeof RUN_STATES)[number];
/** What can have gone wrong. */
export const BAD_OUTCOMES = OUTCOMES.filter((outcome) => outcome !== 'good');

export class RunRecipeDto {
  @ApiProperty({ description: 'Id of the recipe', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Code of the recipe' }) code: string;
  @ApiProperty({ description: 'Title of the recipe' }) title: string;
}

export class RunRevisionDto {
  @ApiProperty({ description: 'Id of the revision', format: 'uuid' }) id: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Number; null: a draft' }) number: number | null;
  @ApiProperty({ enum: codesOf(REVISION_STATE_LABELS), enumName: 'RevisionState', description: 'State of the revision now' })
  state: RevisionState;
}

export class FirstPieceDto {
  @ApiProperty({ description: 'true: it matches and the batch is released' }) ok: boolean;
  @ApiProperty({ description: 'Id of the member who looked at it', format: 'uuid' }) by: string;
  @ApiProperty({ description: 'Name of that member' }) byName: string;
  @ApiProperty({ format: 'date-time', description: 'When' }) at: string;
  @ApiProperty({ description: 'Remark; may be empty' }) note: string;
  @ApiProperty({ type: String, nullable: true, format: 'uuid', description: 'Photo of it; null: none' }) photoId: string | null;
}

export class BadResultDto {
  @ApiProperty({ enum: OUTCOMES, enumName: 'Outcome', description: 'What went wrong' }) outcome: Outcome;
  @ApiProperty({ description: 'Remark; may be empty' }) note: string;
  @ApiProperty({ format: 'date-time', description: 'When it was told' }) at: string;
  @ApiProperty({ description: 'Who told it' }) byName: string;
}

export class RunMeasurementDto {
  @ApiProperty({ description: 'Number of the piece from 1' }) piece: number;
  @ApiProperty({ description: 'What was measured' }) quantity: string;
  @ApiProperty({ description: 'Value' }) value: number;
  @ApiProperty({ description: 'Unit; 1: a pure number' }) unit: string;
  @ApiProperty({ description: 'How' }) method: string;
  @ApiProperty({ type: Boolean, nullable: true, description: 'Meets the acceptance criterion; null: none was recorded for it' })
  meets: boolean | null;
}

export class RunDeviationDto {
  @ApiProperty({ description: 'Id of the deviation', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'What may differ' }) description: string;
  @ApiProperty({ description: 'Who granted it' }) grantedBy: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'Ends at this time; null: by quantity only' })
  endsAt: string | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Ends after so many parts; null: by time only' }) maximumQuantity:
    | number
    | null;
}

/** A run as a row of the list. */
export class RunSummaryDto {
  @ApiProperty({ description: 'Id of the run', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Code that people read, such as J-0007' }) code: string;
  @ApiProperty({ enum: RUN_KINDS, enumName: 'RunKind', description: 'Kind of run' }) kind: RunKind;
  @ApiProperty({ enum: RUN_STATES, description: 'Where it stands' }) state: RunState;
  @ApiProperty({ type: RunRecipeDto, description: 'Recipe' }) recipe: RunRecipeDto;
  @ApiProperty({ type: RunRevisionDto, description: 'Revision that was dialled in' }) revision: RunRevisionDto;
  @ApiProperty({ type: NamedDto, description: 'Machine' }) machine: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Material' }) material: NamedDto;
  @ApiProperty({ description: 'Job, as the shop calls it; may be empty' }) jobReference: string;
  @ApiProperty({ description: 'Part; may be empty' }) part: string;
  @ApiProperty({ description: 'Lot of the material; may be empty' }) lot: string;
  @ApiProperty({ description: 'Good parts' }) good: number;
  @ApiProperty({ description: 'Scrapped parts' }) scrap: number;
  @ApiProperty({ type: FirstPieceDto, nullable: true, description: 'First piece; null: not looked at yet' })
  firstPiece: FirstPieceDto | null;
  @ApiProperty({ type: BadResultDto, nullable: true, description: 'Bad result that was told; null: none' }) badResult: BadResultDto | null;
  @ApiProperty({ type: NamedDto, description: 'Who started it' }) startedBy: NamedDto;
  @ApiProperty({ format: 'date-time', description: 'When it was started' }) startedAt: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was finished' }) finishedAt: string | null;
}

export class RunHoldDto {
  @ApiProperty({ description: 'Id of the hold', format: 'uuid' }) id: string;
  @ApiProperty({ enum: ['recipe', 'machine'], description: 'What is held' }) subject: 'recipe' | 'machine';
  @ApiProperty({ description: 'Why' }) reason: string;
  @ApiProperty({ description: 'Who placed it' }) placedBy: string;
}

export class RunDto extends RunSummaryDto {
  @ApiProperty({ type: NamedDto, description: 'Finish' }) finish: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Effect' }) effect: NamedDto;
  @ApiProperty({ type: NamedDto, nullable: true, description: 'Lens that was fitted' }) lensFitted: NamedDto | null;
  @ApiProperty({ type: [RunHoldDto], description: 'Open holds; they come before everything else' }) holds: RunHoldDto[];
  @ApiProperty({ type: RunStopDto, nullable: true, description: 'Why a run under way must go no further; null: nothing stops it' })
  stop: RunStopDto | null;
  @ApiProperty({ type: [RunCautionDto], description: 'Cautions of the work, never first' }) cautions: RunCautionDto[];
  @ApiProperty({ type: PanelDto, description: 'The fields of the machine’s control, in its order' }) panel: PanelDto;
  @ApiProperty({ type: [MarkStepDto], description: 'Mark steps as dialled in' }) steps: MarkStepDto[];
  @ApiProperty({ type: [StepNumbersDto], description: 'Numbers that follow from each mark step' }) derived: StepNumbersDto[];
  @ApiProperty({ type: [DerivedNumberDto], description: 'Totals over the mark steps; none for a single step' })
  derivedTotals: DerivedNumberDto[];
  @ApiProperty({ type: [SetUpStepDto], description: 'Set-up steps' }) setUpSteps: SetUpStepDto[];
  @ApiProperty({
    type: 'object',
    additionalProperties: { type: 'string' },
    description: 'When each thing was ticked, by “set-up.<place>” and “setting.<step>.<parameter>”',
  })
  ticks: Record<string, string>;
  @ApiProperty({ type: [RunMeasurementDto], description: 'Measurements by piece' }) measurements: RunMeasurementDto[];
  @ApiProperty({ type: RunDeviationDto, nullable: true, description: 'Deviation that it cites' }) deviation: RunDeviationDto | null;
  @ApiProperty({ description: 'Notes; may be empty' }) notes: string;
  @ApiProperty({ description: 'SHA-256 of the content that was dialled in' }) contentHash: string;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: tick, set-up-part, first-piece, finish, bad-result' })
  allowedActions: string[];
}

export class RunPageDto extends PageOf(RunSummaryDto) {}
