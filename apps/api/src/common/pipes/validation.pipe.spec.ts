import { Type } from 'class-transformer';
import { IsArray, IsEmail, IsIn, IsInt, IsString, MaxLength, Min, MinLength, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../decorators/may-be-absent';
import { InvalidError } from '../errors/domain-error';
import { RequestValidationPipe } from './validation.pipe';

class StepDto {
  @IsInt() @Min(1) passes: number;
}
class PlanDto {
  @IsString() @MinLength(3) @MaxLength(5) name: string;
  @IsEmail() 'e/mail': string;
  @IsIn(['a', 'b']) kind: string;
  @MayBeAbsent() @IsString() note?: string;
  @IsArray() @ValidateNested({ each: true }) @Type(() => StepDto) steps: StepDto[];
}

const check = async (value: unknown) => {
  const pipe = new RequestValidationPipe();
  const refusal: unknown = await pipe.transform(value, { type: 'body', metatype: PlanDto }).catch((error: unknown) => error);
  if (refusal instanceof InvalidError) return refusal.extensions.errors;
  return refusal;
};

describe('RequestValidationPipe', () => {
  it('names every wrong field once, nested and escaped, with a sentence', async () => {
    expect(await check({ name: 'toolong', 'e/mail': 'x', kind: 'c', steps: [{ passes: 1 }, { passes: 0 }], extra: 1 })).toEqual([
      { pointer: '#/extra', detail: 'This field is not known here. Leave it out.' },
      { pointer: '#/name', detail: 'Enter at most 5 characters.' },
      { pointer: '#/e~1mail', detail: 'Enter an e-mail address, such as name@example.com.' },
      { pointer: '#/kind', detail: 'Choose one of: a, b.' },
      { pointer: '#/steps/1/passes', detail: 'Enter 1 or more.' },
    ]);
  });

  it('lists all needed fields of an absent body', async () => {
    const errors = await check(undefined);
    expect(errors).toEqual(['name', 'e~1mail', 'kind', 'steps'].map((name) => ({ pointer: `#/${name}`, detail: 'This is needed.' })));
  });

  it('takes no null for a field that may be left out', async () => {
    const plan = { name: 'abcd', 'e/mail': 'a@example.com', kind: 'a', steps: [] };
    expect(await check({ ...plan, note: null })).toEqual([{ pointer: '#/note', detail: 'Enter a value here, or leave the field out.' }]);
    expect(await check(plan)).toBeInstanceOf(PlanDto);
  });

  it.each([[[]], ['text'], [7]])('refuses %j where an object is wanted', async (value) => {
    expect(await check(value)).toEqual([{ pointer: '#', detail: 'Send one JSON object.' }]);
  });

  it.each([['a\u0000b'], ['a\ud800']])('refuses text that cannot be stored (%j)', async (name) => {
    const errors = await check({ name, 'e/mail': 'a@example.com', kind: 'a', steps: [] });
    expect(errors).toEqual([{ pointer: '#/name', detail: 'This holds a character that cannot be stored. Type it again.' }]);
  });

  it('gives an instance of the request class when all is well', async () => {
    expect(await check({ name: 'abcd', 'e/mail': 'a@example.com', kind: 'a', steps: [{ passes: 2 }] })).toBeInstanceOf(PlanDto);
  });
});
