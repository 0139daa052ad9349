import { LengthFault, MM_OF, type LengthToken, type LengthUnit, type TypedUnit } from './length-tokens'
import { doubleFrom, negated, productOf, quotientOf, rationalFrom, sumOf, type Rational } from './rational'

/** A number without a unit, or a length in mm: 2 × 3 mm is a length, 2 mm × 3 mm is not. */
interface Quantity {
  readonly value: Rational
  readonly isLength: boolean
}

/** Reads the grammar of parseLength by recursive descent, in exact fractions of mm; depth is bounded by the length of the text. */
export class LengthReader {
  private next = 0

  constructor(
    private readonly tokens: readonly LengthToken[],
    private readonly unit: LengthUnit,
  ) {}

  readAll(): Rational {
    const quantity = this.readSum()
    const token = this.peek()
    if (token.kind !== 'end') throw new LengthFault(`${wordsOf(token)} is left over: is an operator missing?`)
    return this.asLength(quantity)
  }

  private peek(ahead = 0): LengthToken {
    const last = this.tokens.length - 1
    const token = this.tokens[Math.min(this.next + ahead, last)]
    if (!token) throw new RangeError('there is always an end token')
    return token
  }

  private isSign(sign: string, ahead = 0): boolean {
    const token = this.peek(ahead)
    return token.kind === 'sign' && token.sign === sign
  }

  private asLength({ value, isLength }: Quantity): Rational {
    return isLength ? value : productOf(value, MM_OF[this.unit])
  }

  private readSum(): Quantity {
    let sum = this.readTerm()
    while (this.isSign('+') || this.isSign('-')) {
      const less = this.isSign('-')
      this.next += 1
      const term = this.readTerm()
      const isLength = sum.isLength || term.isLength
      const left = isLength ? this.asLength(sum) : sum.value
      const right = isLength ? this.asLength(term) : term.value
      sum = { value: sumOf(left, less ? negated(right) : right), isLength }
    }
    return sum
  }

  private readTerm(): Quantity {
    let product = this.readFactor()
    while (this.isSign('*') || this.isSign('/')) {
      const divides = this.isSign('/')
      this.next += 1
      const factor = this.readFactor()
      product = divides ? dividedBy(product, factor) : multipliedBy(product, factor)
    }
    return product
  }

  private readFactor(): Quantity {
    if (this.isSign('+') || this.isSign('-')) {
      const less = this.isSign('-')
      this.next += 1
      if (this.isSign('+') || this.isSign('-')) throw new LengthFault('two signs follow one another')
      const factor = this.readFactor()
      return less ? { ...factor, value: negated(factor.value) } : factor
    }
    if (!this.isSign('(')) return this.readMeasure()
    this.next += 1
    const inner = this.readSum()
    if (!this.isSign(')')) throw new LengthFault('a bracket is not closed')
    this.next += 1
    return this.withUnit(inner)
  }

  private readMeasure(): Quantity {
    const amount = this.readAmount()
    const measure = this.withUnit({ value: amount, isLength: false })
    const before = this.peek(-1)
    if (before.kind !== 'unit' || before.unit !== 'ft') return measure
    return this.readInchesAfter(measure)
  }

  /** 7' 2 1/2", 7'-2 1/2" and 7' 2: what follows feet directly is inches, below twelve of them. */
  private readInchesAfter(feet: Quantity): Quantity {
    const hyphen = this.isSign('-') && !this.peek().gapBefore && !this.peek(1).gapBefore ? 1 : 0
    const start = this.peek(hyphen)
    if (start.kind !== 'number' && start.kind !== 'vulgar') return feet
    this.next += hyphen
    const amount = this.readAmount()
    const unit = this.peek()
    if (unit.kind === 'unit') {
      if (unit.unit !== 'in') throw new LengthFault('only inches can follow feet')
      this.next += 1
    }
    if (doubleFrom(amount) >= 12) throw new LengthFault('the inches after feet must be fewer than twelve')
    return { value: sumOf(feet.value, productOf(amount, MM_OF.in)), isLength: true }
  }

  private withUnit(quantity: Quantity): Quantity {
    const token = this.peek()
    if (token.kind !== 'unit') return quantity
    if (quantity.isLength) throw new LengthFault('a length has two units')
    this.next += 1
    return { value: productOf(quantity.value, MM_OF[token.unit]), isLength: true }
  }

  private readAmount(): Rational {
    const first = this.peek()
    if (first.kind === 'vulgar') {
      this.next += 1
      return first.value
    }
    if (first.kind !== 'number') throw new LengthFault(`a number is missing before ${wordsOf(first)}`)
    this.next += 1
    const vulgar = this.peek()
    if (vulgar.kind === 'vulgar') return this.readVulgarAfter(first)
    if (this.isHyphenatedFraction()) return this.readHyphenatedFraction(first)
    if (vulgar.kind === 'number') return this.readMixed(first, 0)
    return this.isLoneFractionWithUnit(first) ? this.readFraction(first, 0) : first.value
  }

  private readVulgarAfter(whole: NumberToken): Rational {
    const vulgar = this.peek()
    if (vulgar.kind !== 'vulgar' || !whole.whole) {
      throw new LengthFault('a fraction can only follow a whole number')
    }
    this.next += 1
    return sumOf(whole.value, vulgar.value)
  }

  /** After a number just read: -n/d with no white space anywhere in it. */
  private isHyphenatedFraction(): boolean {
    const shape = [this.peek(0), this.peek(1), this.peek(2), this.peek(3)] as const
    return (
      this.isSign('-', 0) &&
      shape[1].kind === 'number' &&
      this.isSign('/', 2) &&
      shape[3].kind === 'number' &&
      shape.every((token) => !token.gapBefore) &&
      isNumber(this.peek(-1))
    )
  }

  private readHyphenatedFraction(whole: NumberToken): Rational {
    const follows = this.peek(4)
    const alone = this.tokens.every(
      (token, index) =>
        token.kind !== 'sign' || (index > this.next - 2 && index < this.next + 4) || index === 0,
    )
    if (follows.kind !== 'unit' && !alone) {
      const written = `${whole.text}-${textOf(this.peek(1))}/${textOf(this.peek(3))}`
      throw new LengthFault(
        `${written} could be a mixed number or a subtraction: leave a space instead of the hyphen, or spaces round it`,
      )
    }
    return this.readMixed(whole, 1)
  }

  /** whole numerator/denominator, the numerator standing `ahead` tokens from here. */
  private readMixed(whole: NumberToken, ahead: number): Rational {
    const numerator = this.peek(ahead)
    const stroke = this.peek(ahead + 1)
    const tight = !stroke.gapBefore && !this.peek(ahead + 2).gapBefore
    if (numerator.kind !== 'number' || !this.isSign('/', ahead + 1) || !tight) {
      throw new LengthFault(`${wordsOf(numerator)} follows another number: is an operator missing?`)
    }
    if (!whole.whole) throw new LengthFault('a fraction can only follow a whole number')
    this.next += ahead + 1
    const fraction = this.readFraction(numerator, 0)
    if (fraction.numerator >= fraction.denominator) {
      throw new LengthFault(
        'the fraction of a mixed number must be less than one; to subtract, leave spaces round the minus sign',
      )
    }
    return sumOf(whole.value, fraction)
  }

  /** 5/16" is five sixteenths of an inch, not 5 divided by 16 inches. */
  private isLoneFractionWithUnit(numerator: NumberToken): boolean {
    const tight = !this.peek(0).gapBefore && !this.peek(1).gapBefore
    return (
      numerator.whole && this.isSign('/') && tight && isNumber(this.peek(1)) && this.peek(2).kind === 'unit'
    )
  }

  private readFraction(numerator: NumberToken, ahead: number): Rational {
    const denominator = this.peek(ahead + 1)
    if (denominator.kind !== 'number' || !denominator.whole || !numerator.whole) {
      throw new LengthFault('a fraction is made of two whole numbers')
    }
    if (denominator.value.numerator === 0n) throw new LengthFault('a fraction cannot have 0 below the stroke')
    this.next += ahead + 2
    return rationalFrom(numerator.value.numerator, denominator.value.numerator)
  }
}

type NumberToken = Extract<LengthToken, { kind: 'number' }>

const isNumber = (token: LengthToken): token is NumberToken => token.kind === 'number'

function multipliedBy(a: Quantity, b: Quantity): Quantity {
  if (a.isLength && b.isLength) throw new LengthFault('a length times a length is an area, not a length')
  return { value: productOf(a.value, b.value), isLength: a.isLength || b.isLength }
}

function dividedBy(a: Quantity, b: Quantity): Quantity {
  if (b.value.numerator === 0n) throw new LengthFault('nothing can be divided by 0')
  if (!a.isLength && b.isLength) throw new LengthFault('a number divided by a length is not a length')
  return { value: quotientOf(a.value, b.value), isLength: a.isLength && !b.isLength }
}

const UNIT_NAME: Readonly<Record<TypedUnit, string>> = {
  mm: 'mm',
  cm: 'cm',
  m: 'm',
  in: 'inches',
  ft: 'feet',
}

const textOf = (token: LengthToken): string => (token.kind === 'number' ? token.text : '')

function wordsOf(token: LengthToken): string {
  switch (token.kind) {
    case 'number':
      return `“${token.text}”`
    case 'vulgar':
      return 'a fraction'
    case 'unit':
      return `the unit ${UNIT_NAME[token.unit]}`
    case 'sign':
      return `“${token.sign}”`
    case 'end':
      return 'the end'
  }
}
