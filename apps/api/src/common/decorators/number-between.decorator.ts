import { applyDecorators } from '@nestjs/common';
import { IsNumber, Max, Min } from 'class-validator';

/** A finite number within limits; every refusal names what it is, both limits and the unit. */
export function NumberBetween(low: number, high: number, { what, unit = '' }: { what: string; unit?: string }): PropertyDecorator {
  const message = `${what} must be a number from ${low} to ${high}${unit === '' ? '' : ` ${unit}`}.`;
  return applyDecorators(IsNumber({ allowNaN: false, allowInfinity: false }, { message }), Min(low, { message }), Max(high, { message }));
}
