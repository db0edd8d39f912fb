/**
 * A complex quantity with its exact derivatives by the order h and one parameter p, as a truncated Taylor
 * series: f(h + ε, p + δ) = c₀ + c₁·ε + c₂·ε² + c₃·δ + c₄·ε·δ. Arithmetic on jets differentiates any
 * formula written in them (forward automatic differentiation; Griewank and Walther, Evaluating
 * Derivatives, 2nd ed., SIAM 2008, ch. 13).
 */
export class Jet {
  /** c₀ … c₄, interleaved re, im. */
  readonly c: Float64Array;

  private constructor(c: Float64Array) {
    this.c = c;
  }

  static constant(re: number, im = 0): Jet {
    const c = new Float64Array(10);
    c[0] = re;
    c[1] = im;
    return new Jet(c);
  }

  /** The order itself, ∂/∂h = 1. */
  static order(h: number): Jet {
    const jet = Jet.constant(h);
    jet.c[2] = 1;
    return jet;
  }

  /** The parameter itself, ∂/∂p = 1. */
  static parameter(value: number): Jet {
    const jet = Jet.constant(value);
    jet.c[6] = 1;
    return jet;
  }

  plus(other: Jet): Jet {
    return new Jet(this.c.map((x, k) => x + other.c[k]!));
  }

  minus(other: Jet): Jet {
    return new Jet(this.c.map((x, k) => x - other.c[k]!));
  }

  times(other: Jet | number): Jet {
    if (typeof other === 'number') return new Jet(this.c.map((x) => x * other));
    const out = new Float64Array(10);
    for (const [k, i, j] of products) {
      const [a, b] = [this.c[2 * i]!, this.c[2 * i + 1]!];
      const [x, y] = [other.c[2 * j]!, other.c[2 * j + 1]!];
      out[2 * k] = out[2 * k]! + (a * x - b * y);
      out[2 * k + 1] = out[2 * k + 1]! + (a * y + b * x);
    }
    return new Jet(out);
  }

  /** j·f. */
  turned(): Jet {
    return new Jet(this.c.map((_, k) => (k % 2 === 0 ? -this.c[k + 1]! : this.c[k - 1]!)));
  }

  over(other: Jet): Jet {
    return this.times(other.inverse());
  }

  inverse(): Jet {
    const [re, im] = [this.c[0]!, this.c[1]!];
    const square = re * re + im * im;
    const f = Jet.constant(re / square, -im / square);
    const slope = f.times(f).times(-1);
    return this.composed(f, slope, slope.times(f).times(-2));
  }

  /** Principal root; the root of a constant 0 is 0, of a varying 0 it has no derivative (not finite). */
  squareRoot(): Jet {
    if (this.c.every((x) => x === 0)) return this;
    const [re, im] = [this.c[0]!, this.c[1]!];
    const size = Math.hypot(re, im);
    const f = Jet.constant(Math.sqrt((size + re) / 2), Math.sign(im || 1) * Math.sqrt((size - re) / 2));
    const slope = f.times(2).inverse();
    return this.composed(f, slope, slope.over(Jet.constant(re, im)).times(-0.5));
  }

  exponential(): Jet {
    const size = Math.exp(this.c[0]!);
    const f = Jet.constant(size * Math.cos(this.c[1]!), size * Math.sin(this.c[1]!));
    return this.composed(f, f, f);
  }

  /** Natural logarithm, principal value. */
  logarithm(): Jet {
    const [re, im] = [this.c[0]!, this.c[1]!];
    const f = Jet.constant(Math.log(Math.hypot(re, im)), Math.atan2(im, re));
    const slope = Jet.constant(re, im).inverse();
    return this.composed(f, slope, slope.times(slope).times(-1));
  }

  /** Chain rule: F, F′ and F″ at c₀ given as constants. */
  private composed(f: Jet, slope: Jet, curvature: Jet): Jet {
    const rest = new Jet(this.c.slice());
    rest.c[0] = 0;
    rest.c[1] = 0;
    const square = rest.times(rest).times(0.5);
    return f.plus(rest.times(slope)).plus(square.times(curvature));
  }
}

/** Which products of coefficients i and j give coefficient k. */
const products = [
  [0, 0, 0],
  [1, 0, 1],
  [1, 1, 0],
  [2, 0, 2],
  [2, 1, 1],
  [2, 2, 0],
  [3, 0, 3],
  [3, 3, 0],
  [4, 0, 4],
  [4, 1, 3],
  [4, 3, 1],
  [4, 4, 0],
] as const;
