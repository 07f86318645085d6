import { ValidateIf } from 'class-validator';

/**
 * The field may be left out. Unlike the library's IsOptional it lets no null through: the column behind it takes none, and null is no
 * value where the description of the field says nothing of it.
 */
export const MayBeAbsent = (): PropertyDecorator => ValidateIf((_: unknown, value: unknown) => value !== undefined);
