import { applyDecorators } from '@nestjs/common';
import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { PANEL_UNITS, type PanelUnit } from '@proofplate/physics';
import { ASSISTS, type Assist, FILLS, type Fill, PARAMETERS, type ParameterKey } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { IsDefined, IsIn, IsOptional, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';

const UNIT_CODES = Object.keys(PANEL_UNITS);
/** Far beyond any panel; keeps every value exactly representable. */
export const LARGEST_TYPED_VALUE = 1e9;
const LONGEST_DELAY_US = 100_000;

/** A number in the unit in which it was typed. */
export class TypedValueDto {
  @ApiProperty({ description: 'The number as typed' })
  @NumberBetween(-LARGEST_TYPED_VALUE, LARGEST_TYPED_VALUE, { what: 'This' })
  value: number;

  @ApiProperty({ enum: UNIT_CODES, enumName: 'PanelUnit', description: 'The unit in which it was typed' })
  @IsIn(UNIT_CODES, { message: 'This is no unit of a panel.' })
  unit: PanelUnit;
}

const Typed = (key: ParameterKey) =>
  applyDecorators(
    ApiPropertyOptional({ type: TypedValueDto, description: `${PARAMETERS[key].label} as typed; absent: not set` }),
    IsOptional(),
    ValidateNested(),
    Type(() => TypedValueDto),
  );

export class TypedValuesDto implements Partial<Record<ParameterKey, TypedValueDto>> {
  @Typed('powerPercent') powerPercent?: TypedValueDto;
  @Typed('speedMmPerS') speedMmPerS?: TypedValueDto;
  @Typed('frequencyKhz') frequencyKhz?: TypedValueDto;
  @Typed('pulseWidthNs') pulseWidthNs?: TypedValueDto;
  @Typed('lineSpacingUm') lineSpacingUm?: TypedValueDto;
  @Typed('passes') passes?: TypedValueDto;
  @Typed('focusOffsetMm') focusOffsetMm?: TypedValueDto;
  @Typed('hatchAngleDeg') hatchAngleDeg?: TypedValueDto;
  @Typed('angleStepDeg') angleStepDeg?: TypedValueDto;
  @Typed('wobbleDiameterUm') wobbleDiameterUm?: TypedValueDto;
  @Typed('wobbleFrequencyKhz') wobbleFrequencyKhz?: TypedValueDto;
}

const Delay = (what: string) =>
  applyDecorators(
    ApiPropertyOptional({ description: `${what}, µs` }),
    IsOptional(),
    NumberBetween(-LONGEST_DELAY_US, LONGEST_DELAY_US, { what, unit: 'µs' }),
  );

export class TypedDelaysDto {
  @Delay('The laser-on delay') laserOn?: number;
  @Delay('The laser-off delay') laserOff?: number;
  @Delay('The jump delay') jump?: number;
  @Delay('The corner delay') corner?: number;
}

/** A setting as somebody typed it in the panel’s units. */
export class TypedSettingDto {
  @ApiProperty({ type: TypedValuesDto, description: 'Values by parameter' })
  @IsDefined()
  @ValidateNested()
  @Type(() => TypedValuesDto)
  values: TypedValuesDto;

  @ApiProperty({ enum: FILLS, enumName: 'Fill', description: 'How the area is scanned' })
  @IsIn([...FILLS], { message: 'Choose how the area is filled.' })
  fill: Fill;

  @ApiProperty({ enum: ASSISTS, enumName: 'Assist', description: 'Assist, cover gas, air' })
  @IsIn([...ASSISTS], { message: 'Choose the assist from the list.' })
  assist: Assist;

  @ApiPropertyOptional({ type: TypedDelaysDto, description: 'Delays of the scan head, µs' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => TypedDelaysDto)
  delaysUs?: TypedDelaysDto;
}
