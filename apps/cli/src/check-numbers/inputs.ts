import { isObject, type Json, type JsonObject } from './number-record';

/** Inputs of a record, read with their type; a missing or wrong one is an error that names the key. */
export class Inputs {
  private readonly asked = new Map<string, Inputs | undefined>();

  constructor(
    private readonly json: JsonObject,
    private readonly place = '',
  ) {}

  has(key: string): boolean {
    return this.json[key] !== undefined;
  }

  number(key: string): number {
    const value = this.value(key);
    if (typeof value !== 'number') throw this.wrong(key, 'a number');
    return value;
  }

  numbers(key: string): readonly number[] {
    const value = this.value(key);
    if (!Array.isArray(value)) throw this.wrong(key, 'a list of numbers');
    return value.map((item, index) => {
      if (typeof item !== 'number') throw wrongInput(`${this.place}${key}[${index}]`, 'a number', item);
      return item;
    });
  }

  /** Three numbers, such as a colour. */
  triple(key: string): readonly [number, number, number] {
    const [first, second, third, ...more] = this.numbers(key);
    if (first === undefined || second === undefined || third === undefined || more.length > 0) {
      throw this.wrong(key, 'a list of three numbers');
    }
    return [first, second, third];
  }

  text(key: string): string {
    const value = this.value(key);
    if (typeof value !== 'string') throw this.wrong(key, 'a text');
    return value;
  }

  /** A number that may be null or left out. */
  optionalNumber(key: string): number | undefined {
    const value = this.value(key);
    return value === undefined || value === null ? undefined : this.number(key);
  }

  object(key: string): Inputs {
    const value = this.value(key);
    if (!isObject(value)) throw this.wrong(key, 'an object');
    const inner = new Inputs(value, `${this.place}${key}.`);
    this.asked.set(key, inner);
    return inner;
  }

  /** Keys that nothing has asked for: an input that a formula does not know could change its result. */
  unasked(): readonly string[] {
    return Object.keys(this.json).flatMap((key) => {
      if (!this.asked.has(key)) return [`${this.place}${key}`];
      return this.asked.get(key)?.unasked() ?? [];
    });
  }

  private value(key: string) {
    if (!this.asked.has(key)) this.asked.set(key, undefined);
    return this.json[key];
  }

  private wrong(key: string, wanted: string): TypeError {
    return wrongInput(`${this.place}${key}`, wanted, this.json[key]);
  }
}

function wrongInput(place: string, wanted: string, value: Json | undefined): TypeError {
  return new TypeError(`input ${place} must be ${wanted}, but is ${value === undefined ? 'missing' : JSON.stringify(value)}`);
}
