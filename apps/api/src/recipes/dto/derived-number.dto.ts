import { ApiProperty } from '@nestjs/swagger';

/** A number that follows from a mark step; absent with the reason, never zero instead. */
export class DerivedNumberDto {
  @ApiProperty({ description: 'Key of the number, which names its unit' }) key: string;
  @ApiProperty({ description: 'Unit' }) unit: string;
  @ApiProperty({ description: 'How it is computed' }) formula: string;
  @ApiProperty({ description: 'Where the formula comes from' }) source: string;
  @ApiProperty({ type: Number, nullable: true, description: 'The value; null: see missingBecause' }) value: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why there is no value' }) missingBecause: string | null;
  @ApiProperty({ type: String, nullable: true, description: 'Limit of the formula that the inputs break' }) outOfRange: string | null;
  @ApiProperty({
    type: 'object',
    additionalProperties: { type: 'number' },
    description: 'Numbers that went into it, by name with unit',
  })
  inputs: Record<string, number>;
}

export class StepNumbersDto {
  @ApiProperty({ description: 'Number of the mark step, from 1' }) step: number;
  @ApiProperty({ type: [DerivedNumberDto], description: 'What follows from it' }) numbers: DerivedNumberDto[];
}
