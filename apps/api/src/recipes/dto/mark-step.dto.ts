import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { PANEL_UNITS, type PanelUnit } from '@proofplate/physics';
import {
  ASSISTS,
  type Assist,
  FILLS,
  type Fill,
  PARAMETERS,
  type ParameterKey,
  STEP_PURPOSES,
  type StepPurpose,
} from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { IsBoolean, IsDefined, IsIn, IsOptional, IsUUID, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { ParameterSetDto } from '../../coupons/dto/parameter-set.dto';

const MAX_SET_UP_TEXT_LENGTH = 400;
const LONGEST_PAUSE_S = 3600;
const LONGEST_DELAY_US = 100_000;
/** Far beyond any panel; keeps every value exactly representable. */
const LARGEST_ENTERED_VALUE = 1e9;
const UNIT_CODES = Object.keys(PANEL_UNITS);

/** One mark step as stored and signed. */
export class MarkStepDto {
  @ApiProperty({ enum: STEP_PURPOSES, enumName: 'StepPurpose', description: 'What the step is for' }) purpose: StepPurpose;
  @ApiProperty({ type: ParameterSetDto, description: 'Its parameters' }) parameters: ParameterSetDto;
  @ApiProperty({ description: 'Pause after the step (cool-down), s' }) pauseAfterS: number;
}

/** A number as typed in the panel’s unit; text is read in the browser, where both readings of an ambiguous number are offered. */
export class EnterValueDto {
  @ApiProperty({ description: 'The number as typed' })
  @NumberBetween(-LARGEST_ENTERED_VALUE, LARGEST_ENTERED_VALUE, { what: 'The value' })
  value: number;

  @ApiProperty({ enum: UNIT_CODES, enumName: 'PanelUnit', description: 'The unit in which it was typed' })
  @IsIn(UNIT_CODES, { message: 'This is no unit that a panel shows.' })
  unit: PanelUnit;
}

function ValueOf(key: ParameterKey): PropertyDecorator {
  return (target, property) => {
    ApiPropertyOptional({ type: EnterValueDto, description: `${PARAMETERS[key].label}; absent: not set` })(target, property);
    IsOptional()(target, property);
    ValidateNested()(target, property);
    Type(() => EnterValueDto)(target, property);
  };
}

export class EnterValuesDto implements Partial<Record<ParameterKey, EnterValueDto>> {
  @ValueOf('powerPercent') powerPercent?: EnterValueDto;
  @ValueOf('speedMmPerS') speedMmPerS?: EnterValueDto;
  @ValueOf('frequencyKhz') frequencyKhz?: EnterValueDto;
  @ValueOf('pulseWidthNs') pulseWidthNs?: EnterValueDto;
  @ValueOf('lineSpacingUm') lineSpacingUm?: EnterValueDto;
  @ValueOf('passes') passes?: EnterValueDto;
  @ValueOf('focusOffsetMm') focusOffsetMm?: EnterValueDto;
  @ValueOf('hatchAngleDeg') hatchAngleDeg?: EnterValueDto;
  @ValueOf('angleStepDeg') angleStepDeg?: EnterValueDto;
  @ValueOf('wobbleDiameterUm') wobbleDiameterUm?: EnterValueDto;
  @ValueOf('wobbleFrequencyKhz') wobbleFrequencyKhz?: EnterValueDto;
}

const delay = (what: string): PropertyDecorator => NumberBetween(-LONGEST_DELAY_US, LONGEST_DELAY_US, { what, unit: 'µs' });

export class EnterDelaysDto {
  @ApiPropertyOptional({ description: 'Laser-on delay, µs' })
  @MayBeAbsent()
  @delay('The laser-on delay')
  laserOn?: number;

  @ApiPropertyOptional({ description: 'Laser-off delay, µs' })
  @MayBeAbsent()
  @delay('The laser-off delay')
  laserOff?: number;

  @ApiPropertyOptional({ description: 'Jump delay, µs' })
  @MayBeAbsent()
  @delay('The jump delay')
  jump?: number;

  @ApiPropertyOptional({ description: 'Corner delay, µs' })
  @MayBeAbsent()
  @delay('The corner delay')
  corner?: number;
}

/** One mark step as somebody types it. */
export class EnterStepDto {
  @ApiProperty({ enum: STEP_PURPOSES, enumName: 'StepPurpose', description: 'What the step is for' })
  @IsIn(STEP_PURPOSES, { message: 'Choose what the step is for.' })
  purpose: StepPurpose;

  @ApiProperty({ type: EnterValuesDto, description: 'Values by parameter, in the panel’s units' })
  @IsDefined()
  @ValidateNested()
  @Type(() => EnterValuesDto)
  values: EnterValuesDto;

  @ApiProperty({ enum: FILLS, enumName: 'Fill', description: 'How the area is scanned' })
  @IsIn(FILLS, { message: 'Choose how the area is scanned.' })
  fill: Fill;

  @ApiProperty({ enum: ASSISTS, enumName: 'Assist', description: 'Assist, cover gas, air' })
  @IsIn(ASSISTS, { message: 'Choose the assist from the list.' })
  assist: Assist;

  @ApiPropertyOptional({ type: EnterDelaysDto, description: 'Delays of the scan head' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => EnterDelaysDto)
  delaysUs?: EnterDelaysDto;

  @ApiPropertyOptional({ description: 'Pause after the step (cool-down), s', default: 0 })
  @MayBeAbsent()
  @NumberBetween(0, LONGEST_PAUSE_S, { what: 'The pause', unit: 's' })
  pauseAfterS: number = 0;
}

/** One thing to do before marking, in its order. */
export class SetUpStepDto {
  @ApiProperty({ description: 'What to do', maxLength: MAX_SET_UP_TEXT_LENGTH })
  @RequiredText(MAX_SET_UP_TEXT_LENGTH, 'Say what to do.')
  text: string;

  @ApiPropertyOptional({ description: 'What to watch out for', maxLength: MAX_SET_UP_TEXT_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_SET_UP_TEXT_LENGTH)
  caution?: string;

  @ApiPropertyOptional({ description: 'Photo that shows it', format: 'uuid' })
  @MayBeAbsent()
  @IsUUID('all', { message: 'This does not name a photo.' })
  photoId?: string;

  @ApiProperty({ description: 'true: a run starts only when this is ticked' })
  @IsBoolean({ message: 'Choose yes or no.' })
  mustTick: boolean;
}
