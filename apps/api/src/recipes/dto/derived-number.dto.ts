import { ApiProperty } from '@nestjs/swagger';
import type { ParameterKey } from '@proofplate/recipe-model';
import { PARAMETER_KEY_ENUM } from '../../coupons/dto/parameter-set.dto';

/** A number that follows from a mark step; absent with the reason, never zero instead. */
export class DerivedNumberDto {
  @ApiProperty({ description: 'Key of the number, which names its unit' }) key: string;
  @ApiProperty({ description: 'Unit' }) unit: string;
  @ApiProperty({ description: 'How it is computed' }) formula: string;
  @ApiProperty({ description: 'Where the formula comes from' }) source: string;
  @ApiProperty({ type: Number, nullable: true, description: 'The value; null: see missingBecause' }) value: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why there is no value' }) missingBecause: string | null;
  @ApiProperty({ description: 'true: it has no meaning in this mode, so no input would bring it' }) isRuledOutByMode: boolean;
  @ApiProperty({
    type: [String],
    description: 'What to look at: range of the formula, gaps between spots or lines, energy above the source’s, dose above the caution',
  })
  lookAt: string[];
  @ApiProperty({
    type: 'object',
    additionalProperties: { type: 'number' },
    description: 'Numbers that went into it, by name with unit',
  })
  inputs: Record<string, number>;
}

export class SettingRemarkDto {
  @ApiProperty({ ...PARAMETER_KEY_ENUM, description: 'Value that it is about' }) parameter: ParameterKey;
  @ApiProperty({ description: 'What the panel cannot show or the machine cannot do' }) text: string;
}

export class StepNumbersDto {
  @ApiProperty({ description: 'Number of the mark step, from 1' }) step: number;
  @ApiProperty({ type: [DerivedNumberDto], description: 'What follows from it' }) numbers: DerivedNumberDto[];
  @ApiProperty({ type: [SettingRemarkDto], description: 'Values to look at themselves' }) remarks: SettingRemarkDto[];
}
