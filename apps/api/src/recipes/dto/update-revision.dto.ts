import { ApiPropertyOptional } from '@nestjs/swagger';
import { ROUTE_KINDS, type RouteKind } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { ArrayMaxSize, IsArray, IsIn, IsUUID, ValidateIf, ValidateNested } from 'class-validator';
import { IsMoment } from '../../common/decorators/is-moment';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { MAX_REASON_LENGTH, MAX_STEPS } from './create-recipe.dto';
import { EnterStepDto, SetUpStepDto } from './mark-step.dto';
import { LimitsOfUseDto, RecipeScopeDto } from './scope.dto';

const MAX_SET_UP_STEPS = 50;
const MAX_CAUTIONS = 100;
const isGiven = (_: unknown, value: unknown) => value !== undefined && value !== null;

/** What changes in a draft; what is absent stays, a given list replaces the earlier one. */
export class UpdateRevisionDto {
  @ApiPropertyOptional({ type: [EnterStepDto], description: 'Mark steps in their order, in the panel’s units' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_STEPS)
  @ValidateNested({ each: true })
  @Type(() => EnterStepDto)
  steps?: EnterStepDto[];

  @ApiPropertyOptional({ type: [SetUpStepDto], description: 'Set-up steps in their order' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_SET_UP_STEPS)
  @ValidateNested({ each: true })
  @Type(() => SetUpStepDto)
  setUpSteps?: SetUpStepDto[];

  @ApiPropertyOptional({ type: LimitsOfUseDto, description: 'Limits of use' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => LimitsOfUseDto)
  limits?: LimitsOfUseDto;

  @ApiPropertyOptional({ type: RecipeScopeDto, description: 'What it covers beyond the five keys' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => RecipeScopeDto)
  scope?: RecipeScopeDto;

  @ApiPropertyOptional({ description: 'Reason for the change', maxLength: MAX_REASON_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_REASON_LENGTH)
  reason?: string;

  @ApiPropertyOptional({ enum: ROUTE_KINDS, enumName: 'RouteKind', description: 'How the setting was come by' })
  @MayBeAbsent()
  @IsIn(ROUTE_KINDS, { message: 'Choose how the setting was come by.' })
  route?: RouteKind;

  @ApiPropertyOptional({ description: 'Written grounds where it was not proved on coupons; given by a lead', maxLength: MAX_REASON_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_REASON_LENGTH)
  grounds?: string;

  @ApiPropertyOptional({ type: String, nullable: true, format: 'date-time', description: 'When it takes effect; null: with its approval' })
  @ValidateIf(isGiven)
  @IsMoment()
  effectiveFrom?: string | null;

  @ApiPropertyOptional({
    type: String,
    nullable: true,
    format: 'date-time',
    description: 'When it is to be proved again; null: by the shop’s policy',
  })
  @ValidateIf(isGiven)
  @IsMoment()
  reviewDue?: string | null;

  @ApiPropertyOptional({ type: String, nullable: true, format: 'uuid', description: 'Power calibration of the machine; null: none' })
  @ValidateIf(isGiven)
  @IsUUID('all', { message: 'Choose a calibration of the machine.' })
  calibrationId?: string | null;

  @ApiPropertyOptional({ type: [String], description: 'Cautions that the author acknowledged' })
  @MayBeAbsent()
  @IsArray()
  @ArrayMaxSize(MAX_CAUTIONS)
  @IsUUID('all', { each: true, message: 'Choose cautions of the list.' })
  acknowledgedCautionIds?: string[];
}
