import { applyDecorators } from '@nestjs/common';
import { Transform } from 'class-transformer';
import { IsNotEmpty, IsString, MaxLength } from 'class-validator';

/** Text whose outer blanks do not count. It may be empty. */
export function TrimmedText(maxLength: number): PropertyDecorator {
  return applyDecorators(
    Transform(({ value }: { value: unknown }) => (typeof value === 'string' ? value.trim() : value)),
    IsString(),
    MaxLength(maxLength),
  );
}

/** As TrimmedText, but something must be left; the refusal says what to enter. */
export function RequiredText(maxLength: number, message: string): PropertyDecorator {
  return applyDecorators(TrimmedText(maxLength), IsNotEmpty({ message }));
}
