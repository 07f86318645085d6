import { Controller, Get, Param } from '@nestjs/common';
import { ApiOkResponse, ApiOperation, ApiProperty, ApiTags } from '@nestjs/swagger';
import { Public } from './decorators/public.decorator';
import { NotFoundError } from './errors/domain-error';
import { PROBLEMS } from './errors/problem-catalogue';

export class ProblemTypeDto {
  @ApiProperty({ description: 'Last part of the type URI' }) code: string;
  @ApiProperty({ description: 'Short name of the problem' }) title: string;
  @ApiProperty({ description: 'HTTP status it comes with' }) status: number;
  @ApiProperty({ description: 'What it means and how to get past it' }) meaning: string;
}

/** Where the `type` of every problem answer leads. */
@ApiTags('problems')
@Controller('problems')
export class ProblemsController {
  @Public()
  @Get(':code')
  @ApiOperation({ summary: 'What a problem type means' })
  @ApiOkResponse({ type: ProblemTypeDto })
  get(@Param('code') code: string): ProblemTypeDto {
    const text = Object.hasOwn(PROBLEMS, code) ? PROBLEMS[code] : undefined;
    if (text === undefined) throw new NotFoundError('There is no such problem type.');
    return { code, ...text };
  }
}
