import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { ArrayMaxSize, IsArray, IsBoolean, IsUUID, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { NamedDto } from '../../coupons/dto/coupon.dto';
import { CalibrationPointDto } from '../../machines/dto/calibration.dto';
import { PanelDto } from '../../machines/dto/panel.dto';
import { FREQUENCY_LIMITS_KHZ, PhysicalProfileDto } from '../../machines/dto/physical-profile.dto';
import { MAX_STEPS } from './create-recipe.dto';
import { MarkStepDto } from './mark-step.dto';

const FARTHEST_OFFSET_MM = 1000;
const OUTCOMES = ['equivalent', 'not equivalent', 'not known'] as const;
export type TransferOutcomeCode = (typeof OUTCOMES)[number];

/** What somebody chose for one step; what is absent is chosen by rule. */
export class TransferChoiceDto {
  @ApiPropertyOptional({ description: 'Pulse frequency on the target, kHz; absent: nearest to the source’s inside the interval' })
  @MayBeAbsent()
  @NumberBetween(FREQUENCY_LIMITS_KHZ.low, FREQUENCY_LIMITS_KHZ.high, { what: 'The frequency', unit: 'kHz' })
  frequencyKhz?: number;

  @ApiPropertyOptional({ description: 'Focus offset on the target, mm; absent: the same share of the Rayleigh length' })
  @MayBeAbsent()
  @NumberBetween(-FARTHEST_OFFSET_MM, FARTHEST_OFFSET_MM, { what: 'The focus offset', unit: 'mm' })
  focusOffsetMm?: number;
}

export class PreviewTransferDto {
  @ApiProperty({ format: 'uuid', description: 'Target machine' })
  @IsUUID('all', { message: 'Choose a machine of the shop.' })
  machineId: string;

  @ApiProperty({ format: 'uuid', description: 'Lens that is used on the target machine' })
  @IsUUID('all', { message: 'Choose a lens of the machine.' })
  lensId: string;

  @ApiPropertyOptional({ type: [TransferChoiceDto], description: 'Choices by mark step, in their order' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_STEPS)
  @ValidateNested({ each: true })
  @Type(() => TransferChoiceDto)
  choices?: TransferChoiceDto[];
}

export class CreateTransferDto extends PreviewTransferDto {
  @ApiPropertyOptional({ description: 'true: draft what comes nearest although it is not equivalent', default: false })
  @MayBeAbsent()
  @IsBoolean({ message: 'Choose yes or no.' })
  acceptNotEquivalent: boolean = false;

  @ApiPropertyOptional({ format: 'uuid', description: 'Recipe with the target’s five keys that gets the draft; absent: a new recipe' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'Choose a recipe of the shop.' })
  recipeId?: string;
}

export class TransferCalibrationDto {
  @ApiProperty({ format: 'uuid', description: 'Id of the power table' }) id: string;
  @ApiProperty({ format: 'date', description: 'Day of the reading' }) measuredOn: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Pulse frequency of the reading, kHz; null: continuous' }) frequencyKhz:
    | number
    | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Pulse width of the reading, ns; null: not settable' }) pulseWidthNs:
    | number
    | null;
  @ApiProperty({ type: [CalibrationPointDto], description: 'The readings, percent rising' }) points: CalibrationPointDto[];
}

/** A machine with one of its lenses, as far as a transfer needs to know it. */
export class TransferPlaceDto {
  @ApiProperty({ type: NamedDto, description: 'Machine' }) machine: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Lens' }) lens: NamedDto;
  @ApiProperty({ description: 'Focal length, mm' }) focalLengthMm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Measured 1/e² spot in focus, µm; null: computed from the beam' })
  measuredSpotUm: number | null;
  @ApiProperty({ type: PhysicalProfileDto, description: 'Source and scan head' }) physical: PhysicalProfileDto;
  @ApiProperty({ type: PanelDto, description: 'The fields of the control in its order' }) panel: PanelDto;
  @ApiProperty({ type: [TransferCalibrationDto], description: 'Power tables in the order in which they are taken' })
  calibrations: TransferCalibrationDto[];
}

export class TransferRecipeDto {
  @ApiProperty({ format: 'uuid', description: 'Id of the recipe' }) id: string;
  @ApiProperty({ description: 'Code that people read' }) code: string;
  @ApiProperty({ description: 'Title' }) title: string;
}

export class TransferTargetDto extends TransferPlaceDto {
  @ApiProperty({ type: [TransferRecipeDto], description: 'Recipes of the same material, finish and effect that exist there already' })
  recipes: TransferRecipeDto[];
}

/** Everything that the browser needs to work a transfer out as the server does. */
export class TransferGroundDto {
  @ApiProperty({ type: TransferPlaceDto, description: 'Machine and lens of the revision, as it was signed' }) source: TransferPlaceDto;
  @ApiProperty({ type: [MarkStepDto], description: 'Mark steps of the revision' }) steps: MarkStepDto[];
  @ApiProperty({ type: [TransferTargetDto], description: 'Every other machine and lens of the shop' }) targets: TransferTargetDto[];
}

export class TransferReasonDto {
  @ApiProperty({ description: 'Which reason' }) code: string;
  @ApiProperty({ description: 'The reason in words, with the way out' }) text: string;
  @ApiProperty({ type: String, nullable: true, enum: ['source', 'target', null], description: 'Whose machine page brings what is missing' })
  side: 'source' | 'target' | null;
}

export class KeptNumberDto {
  @ApiProperty({ description: 'Which number' }) key: string;
  @ApiProperty({ description: 'The number in words' }) label: string;
  @ApiProperty({ description: 'Unit; 1: none' }) unit: string;
  @ApiProperty({ description: 'On the source' }) source: number;
  @ApiProperty({ description: 'On the target, with what its panel shows' }) target: number;
  @ApiProperty({ description: '(target − source) / source' }) deviation: number;
}

export class TransferIntervalDto {
  @ApiProperty({ description: 'Lowest frequency that keeps the numbers, kHz' }) lowestKhz: number;
  @ApiProperty({ description: 'Highest, kHz; below the lowest where there is none' }) highestKhz: number;
  @ApiProperty({ description: 'true: no frequency keeps the numbers' }) isEmpty: boolean;
  @ApiProperty({ enum: ['frequency range', 'rated power', 'scan speed'], description: 'What ends it at the top' }) endsBy: string;
}

export class TransferStepDto {
  @ApiProperty({ description: 'Number of the mark step, from 1' }) step: number;
  @ApiProperty({ enum: OUTCOMES, description: 'Whether the kept numbers agree' }) outcome: TransferOutcomeCode;
  @ApiProperty({ type: [TransferReasonDto], description: 'Why not, all of it' }) reasons: TransferReasonDto[];
  @ApiProperty({ type: TransferIntervalDto, nullable: true, description: 'Feasible frequencies of a pulsed step' })
  interval: TransferIntervalDto | null;
  @ApiProperty({ type: MarkStepDto, nullable: true, description: 'What the target’s panel would show; null: no number' })
  proposal: MarkStepDto | null;
  @ApiProperty({ type: [KeptNumberDto], description: 'What is kept, and how far the panel’s steps move it' }) kept: KeptNumberDto[];
  @ApiProperty({ type: Number, nullable: true, description: 'Beam-on time over that of the source' }) timeRatio: number | null;
}

export class TransferPreviewDto {
  @ApiProperty({ enum: OUTCOMES, description: 'The worst of the steps' }) outcome: TransferOutcomeCode;
  @ApiProperty({ description: 'true: a draft can be created; unless equivalent, only as not equivalent' }) isDraftable: boolean;
  @ApiProperty({ type: [TransferReasonDto], description: 'Reasons that hold for all steps' }) reasons: TransferReasonDto[];
  @ApiProperty({ type: [TransferStepDto], description: 'By mark step' }) steps: TransferStepDto[];
}
