import { refused, ok, type Result } from '../../src/domain/units/result';

/** A check whose inputs cannot be read is a failure of that check and not of the run. */
export class InputProblem extends Error {}

/** Reads the inputs of one check by name, with a default only where the format states one. */
export class Inputs {
  readonly #raw: Readonly<Record<string, unknown>>;

  constructor(raw: Readonly<Record<string, unknown>>) {
    this.#raw = raw;
  }

  has(name: string): boolean {
    return this.#raw[name] !== undefined && this.#raw[name] !== null;
  }

  number(name: string, otherwise?: number): number {
    const value = this.#raw[name];
    if (typeof value === 'number') return value;
    if (!this.has(name) && otherwise !== undefined) return otherwise;
    throw new InputProblem(`input ${name} ${this.has(name) ? 'is not a number' : 'is missing'}`);
  }

  text(name: string): string {
    const value = this.#raw[name];
    if (typeof value === 'string') return value;
    throw new InputProblem(`input ${name} ${this.has(name) ? 'is not a text' : 'is missing'}`);
  }

  truth(name: string, otherwise?: boolean): boolean {
    const value = this.#raw[name];
    if (typeof value === 'boolean') return value;
    if (!this.has(name) && otherwise !== undefined) return otherwise;
    throw new InputProblem(`input ${name} ${this.has(name) ? 'is not true or false' : 'is missing'}`);
  }

  /** Named values that stand together under one name. */
  group(name: string): Inputs {
    const value = this.#raw[name];
    if (isNamedValues(value)) return new Inputs(value);
    const given = typeof value === 'string' ? `"${value}" is not in the file` : 'is not a group of values';
    throw new InputProblem(`input ${name} ${this.has(name) ? given : 'is missing'}`);
  }

  oneOf<T extends string>(name: string, choices: readonly T[]): Result<T> {
    const value = this.text(name);
    const found = choices.find((choice) => choice === value);
    return found === undefined
      ? refused({ type: 'unknown-choice', field: name, words: `${name} "${value}" is not known` })
      : ok(found);
  }
}

function isNamedValues(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
