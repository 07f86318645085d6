import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { PANEL_UNITS, type PanelUnit } from '@proofplate/physics';
import { ASSISTS, type Assist, FILLS, type Fill, PARAMETER_KEYS, PARAMETERS, type ParameterKey } from '@proofplate/recipe-model';

const UNIT_CODES = Object.keys(PANEL_UNITS);

export class EnteredValueDto {
  @ApiProperty({ description: 'The number as typed' }) value: number;
  @ApiProperty({ enum: UNIT_CODES, enumName: 'PanelUnit', description: 'The unit in which it was typed' }) unit: PanelUnit;
}

/** A typed value beside the physical one. */
export class SetValueDto {
  @ApiProperty({ type: EnteredValueDto, description: 'What was typed, in the panel’s unit; never recomputed' }) entered: EnteredValueDto;
  @ApiProperty({ description: 'The same in the parameter’s own unit' }) physical: number;
}

const value = (key: ParameterKey) => ApiPropertyOptional({ type: SetValueDto, description: `${PARAMETERS[key].label}; absent: not set` });

/** Values by parameter. What is absent is not set, or not known on a plate burnt earlier. */
export class ParameterValuesDto implements Partial<Record<ParameterKey, SetValueDto>> {
  @value('powerPercent') powerPercent?: SetValueDto;
  @value('speedMmPerS') speedMmPerS?: SetValueDto;
  @value('frequencyKhz') frequencyKhz?: SetValueDto;
  @value('pulseWidthNs') pulseWidthNs?: SetValueDto;
  @value('lineSpacingUm') lineSpacingUm?: SetValueDto;
  @value('passes') passes?: SetValueDto;
  @value('focusOffsetMm') focusOffsetMm?: SetValueDto;
  @value('hatchAngleDeg') hatchAngleDeg?: SetValueDto;
  @value('angleStepDeg') angleStepDeg?: SetValueDto;
  @value('wobbleDiameterUm') wobbleDiameterUm?: SetValueDto;
  @value('wobbleFrequencyKhz') wobbleFrequencyKhz?: SetValueDto;
}

export class WorkPowerDto {
  @ApiProperty({ type: Number, nullable: true, description: 'Average power at the work, W; null: not known, see reason' })
  watts: number | null;
  @ApiPropertyOptional({ enum: ['calibration', 'not calibrated'], description: 'Where the watts come from' })
  basis?: 'calibration' | 'not calibrated';
  @ApiPropertyOptional({ description: 'Why the watts are not known' }) reason?: string;
}

export class DelaysDto {
  @ApiPropertyOptional({ description: 'Laser-on delay, µs' }) laserOn?: number;
  @ApiPropertyOptional({ description: 'Laser-off delay, µs' }) laserOff?: number;
  @ApiPropertyOptional({ description: 'Jump delay, µs' }) jump?: number;
  @ApiPropertyOptional({ description: 'Corner delay, µs' }) corner?: number;
}

/** A whole parameter set, as one mark step or one cell holds it. */
export class ParameterSetDto {
  @ApiProperty({ type: ParameterValuesDto, description: 'Values by parameter' }) values: ParameterValuesDto;
  @ApiProperty({ enum: FILLS, enumName: 'Fill', description: 'How the area is scanned' }) fill: Fill;
  @ApiProperty({ enum: ASSISTS, enumName: 'Assist', description: 'Assist, cover gas, air' }) assist: Assist;
  @ApiPropertyOptional({ type: DelaysDto, description: 'Delays of the scan head, µs' }) delaysUs?: DelaysDto;
  @ApiProperty({ type: WorkPowerDto, description: 'Average power at the work' }) power: WorkPowerDto;
}

export const PARAMETER_KEY_ENUM = { enum: [...PARAMETER_KEYS], enumName: 'ParameterKey' } as const;
