import { isObject, type JsonObject } from './number-record';

/** Inputs of a record, read with their type; a missing or wrong one is an error that names the key. */
export class Inputs {
  constructor(private readonly json: JsonObject) {}

  has(key: string): boolean {
    return this.json[key] !== undefined;
  }

  number(key: string): number {
    const value = this.json[key];
    if (typeof value !== 'number') throw new TypeError(`input ${key} is not a number`);
    return value;
  }

  numbers(key: string): readonly number[] {
    const value = this.json[key];
    if (!Array.isArray(value)) throw new TypeError(`input ${key} is not a list of numbers`);
    return value.map((item, index) => {
      if (typeof item !== 'number') throw new TypeError(`input ${key}[${index}] is not a number`);
      return item;
    });
  }

  text(key: string): string {
    const value = this.json[key];
    if (typeof value !== 'string') throw new TypeError(`input ${key} is not a text`);
    return value;
  }

  /** A number that may be null or left out. */
  optionalNumber(key: string): number | undefined {
    const value = this.json[key];
    return value === undefined || value === null ? undefined : this.number(key);
  }

  object(key: string): Inputs {
    const value = this.json[key];
    if (!isObject(value)) throw new TypeError(`input ${key} is not an object`);
    return new Inputs(value);
  }
}
