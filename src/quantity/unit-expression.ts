import type { FaultKind } from '../errors';
import { likelyUnit } from './unit-names';
import { findUnit, type Exponents } from './units';

/** What a unit expression amounts to: SI value = number x factor, and the scale's zero where it is one bare unit. */
export interface UnitValue {
  exponents: Exponents;
  factor: number;
  /** Present only when the whole expression is one temperature unit to the power one. */
  offset?: number;
}

export class UnitFault extends Error {
  override readonly name = 'UnitFault';
  constructor(
    readonly kind: FaultKind,
    readonly reason: string,
  ) {
    super(reason);
  }
}

const LARGEST_EXPONENT = 12;
const SYMBOL = /^(?:at\.?%|mmH2O|inH2O|°[CF]?|[%‰]|[A-Za-zµΩÅ]+)/;
const EXPONENT = /^(?:\^ ?\( ?([+-]?\d+) ?\)|\^ ?([+-]?\d+)|([+-]?\d+))/;

/** Reads one unit expression by recursive descent; a product after a quotient is refused, not guessed. */
class Reader {
  private position = 0;
  constructor(private readonly text: string) {}

  whole(): UnitValue {
    const value = this.product(0);
    if (this.position < this.text.length) throw this.unexpected();
    return value;
  }

  private product(depth: number): UnitValue {
    const start = this.position;
    let result: UnitValue | undefined;
    let slash = -1;
    for (;;) {
      const joint = this.joint();
      if (this.position >= this.text.length || this.text[this.position] === ')') {
        if (joint === '/' || joint === '*' || result === undefined) throw this.incomplete();
        return result;
      }
      if (joint === '*' && result === undefined) throw this.unexpected();
      if (slash >= 0 && joint !== '/') throw this.ambiguous(start, slash, depth);
      if (joint === '/') slash = slash < 0 ? this.text.lastIndexOf('/', this.position - 1) : slash;
      const factor = this.factor(depth);
      result = combine(result, factor, joint === '/' ? -1 : 1);
    }
  }

  /** Moves past what joins two factors and says which it was. */
  private joint(): '/' | '*' | ' ' {
    const match = /^ ?([/*]?) ?/.exec(this.text.slice(this.position))!;
    this.position += match[0].length;
    return match[1] === '/' || match[1] === '*' ? match[1] : ' ';
  }

  private factor(depth: number): UnitValue {
    let value: UnitValue;
    if (this.text[this.position] === '(') {
      if (depth >= 8) throw new UnitFault('not a quantity', 'the unit has too many nested brackets');
      this.position++;
      value = this.product(depth + 1);
      if (this.text[this.position] !== ')')
        throw new UnitFault('not a quantity', 'a bracket in the unit is not closed');
      this.position++;
    } else if (/^1 ?(?=\/)/.test(this.text.slice(this.position))) {
      this.position++;
      return { exponents: [0, 0, 0, 0, 0, 0], factor: 1 };
    } else value = this.symbol();
    return this.raised(value);
  }

  private symbol(): UnitValue {
    const match = SYMBOL.exec(this.text.slice(this.position));
    if (match === null) throw this.unexpected();
    const unit = findUnit(match[0]);
    if (unit === undefined) {
      const near = likelyUnit(match[0]);
      const hint = near === undefined ? '' : ` (did you mean "${near}"?)`;
      throw new UnitFault('unknown unit', `the unit "${match[0]}" is not known${hint}`);
    }
    this.position += match[0].length;
    return unit;
  }

  private raised(value: UnitValue): UnitValue {
    const match = EXPONENT.exec(this.text.slice(this.position));
    if (match === null) {
      if (this.text[this.position] === '^')
        throw new UnitFault('not a quantity', 'an exponent must be a whole number');
      return value;
    }
    this.position += match[0].length;
    const power = Number(match[1] ?? match[2] ?? match[3]);
    if (this.text[this.position] === '.')
      throw new UnitFault('not a quantity', 'an exponent must be a whole number');
    if (Math.abs(power) > LARGEST_EXPONENT)
      throw new UnitFault('not a quantity', `the exponent ${power} is too large`);
    if (power === 1) return value;
    const exponents = value.exponents.map((exponent) => exponent * power);
    return { exponents: exponents as unknown as Exponents, factor: value.factor ** power };
  }

  private ambiguous(start: number, slash: number, depth: number): UnitFault {
    const joint = this.text.slice(0, this.position).trimEnd().replace(/\*$/, '').trimEnd();
    const above = this.text.slice(start, slash).trim() || '1';
    const below = joint.slice(slash + 1).trim();
    const rest = this.text.slice(this.position);
    const further = (depth > 0 ? rest.split(')')[0]! : rest).trim();
    return new UnitFault(
      'ambiguous unit',
      `the unit "${this.text}" can be read in two ways; write ${above}/(${below} ${further}) or (${above}/${below}) ${further}`,
    );
  }

  private unexpected(): UnitFault {
    const rest = this.text.slice(this.position);
    const found = /^[+-]?[\d.]+|^./u.exec(rest)?.[0] ?? rest;
    return new UnitFault('not a quantity', `"${found}" is not expected in the unit "${this.text}"`);
  }

  private incomplete(): UnitFault {
    return new UnitFault('not a quantity', `the unit "${this.text}" is not complete`);
  }
}

function combine(result: UnitValue | undefined, factor: UnitValue, sign: 1 | -1): UnitValue {
  if (result === undefined && sign === 1) return factor;
  const left = result ?? { exponents: [0, 0, 0, 0, 0, 0], factor: 1 };
  const exponents = left.exponents.map((exponent, i) => exponent + sign * factor.exponents[i]!);
  return {
    exponents: exponents as unknown as Exponents,
    factor: sign === 1 ? left.factor * factor.factor : left.factor / factor.factor,
  };
}

/**
 * The size and dimension of a unit expression such as "W/(cm^2 K)", "W cm-2 K-1", "/m" or "nm/degC".
 * Inside a product or quotient degC and degF are differences (no offset).
 * @param text normalised text (see `normalise`), without the number
 * @throws UnitFault with its kind, when a unit is unknown, ambiguous or not complete
 */
export function readUnit(text: string): UnitValue {
  return new Reader(text).whole();
}
