import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';

export class FieldProblemDto {
  @ApiProperty({ description: 'JSON pointer of the field, such as #/steps/0/passes' }) pointer: string;
  @ApiProperty({ description: 'How to put it right' }) detail: string;
}

/** Problem details of RFC 9457; some problems add further members. */
export class ProblemDto {
  @ApiProperty({ description: 'Address that explains the type' }) type: string;
  @ApiProperty({ description: 'Short name of the type' }) title: string;
  @ApiProperty({ description: 'HTTP status' }) status: number;
  @ApiProperty({ description: 'This case, in words for people' }) detail: string;
  @ApiProperty({ description: 'Id of the request in the log' }) instance: string;
  @ApiProperty({ description: 'Last part of the type' }) code: string;
  @ApiPropertyOptional({ type: [FieldProblemDto], description: 'Wrong fields' }) errors?: FieldProblemDto[];
  @ApiPropertyOptional({ type: 'object', additionalProperties: true, description: 'Present state, with stale-version' }) current?: object;
}
