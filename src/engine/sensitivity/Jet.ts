/**
 * A complex quantity with its exact derivatives by the order h and one parameter p, as a truncated Taylor
 * series: f(h + ε, p + δ) = c₀ + c₁·ε + c₂·ε² + c₃·δ + c₄·ε·δ. Arithmetic on jets differentiates any
 * formula written in them (forward automatic differentiation; Griewank and Walther, Evaluating
 * Derivatives, 2nd ed., SIAM 2008, ch. 13).
 */
export class Jet {
  /** c₀ … c₄, interleaved re, im. A plain array: ten numbers are made far faster than a typed array. */
  readonly c: Ten;

  private constructor(c: Ten) {
    this.c = c;
  }

  static constant(re: number, im = 0): Jet {
    return new Jet([re, im, 0, 0, 0, 0, 0, 0, 0, 0]);
  }

  /** The order itself, ∂/∂h = 1. */
  static order(h: number): Jet {
    return new Jet([h, 0, 1, 0, 0, 0, 0, 0, 0, 0]);
  }

  /** The parameter itself, ∂/∂p = 1. */
  static parameter(value: number): Jet {
    return new Jet([value, 0, 0, 0, 0, 0, 1, 0, 0, 0]);
  }

  plus(other: Jet): Jet {
    return this.combined(other, 1);
  }

  minus(other: Jet): Jet {
    return this.combined(other, -1);
  }

  times(other: Jet | number): Jet {
    const [a0, b0, a1, b1, a2, b2, a3, b3, a4, b4] = this.c;
    if (typeof other === 'number') {
      const s = other;
      return new Jet([a0 * s, b0 * s, a1 * s, b1 * s, a2 * s, b2 * s, a3 * s, b3 * s, a4 * s, b4 * s]);
    }
    const [x0, y0, x1, y1, x2, y2, x3, y3, x4, y4] = other.c;
    return new Jet([
      a0 * x0 - b0 * y0,
      a0 * y0 + b0 * x0,
      a0 * x1 - b0 * y1 + (a1 * x0 - b1 * y0),
      a0 * y1 + b0 * x1 + (a1 * y0 + b1 * x0),
      a0 * x2 - b0 * y2 + (a1 * x1 - b1 * y1) + (a2 * x0 - b2 * y0),
      a0 * y2 + b0 * x2 + (a1 * y1 + b1 * x1) + (a2 * y0 + b2 * x0),
      a0 * x3 - b0 * y3 + (a3 * x0 - b3 * y0),
      a0 * y3 + b0 * x3 + (a3 * y0 + b3 * x0),
      a0 * x4 - b0 * y4 + (a1 * x3 - b1 * y3) + (a3 * x1 - b3 * y1) + (a4 * x0 - b4 * y0),
      a0 * y4 + b0 * x4 + (a1 * y3 + b1 * x3) + (a3 * y1 + b3 * x1) + (a4 * y0 + b4 * x0),
    ]);
  }

  /** j·f. */
  turned(): Jet {
    const [a0, b0, a1, b1, a2, b2, a3, b3, a4, b4] = this.c;
    return new Jet([-b0, a0, -b1, a1, -b2, a2, -b3, a3, -b4, a4]);
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
    const [, , a1, b1, a2, b2, a3, b3, a4, b4] = this.c;
    const rest = new Jet([0, 0, a1, b1, a2, b2, a3, b3, a4, b4]);
    return f.plus(rest.times(slope)).plus(rest.times(rest).times(0.5).times(curvature));
  }

  private combined(other: Jet, s: number): Jet {
    const [a0, b0, a1, b1, a2, b2, a3, b3, a4, b4] = this.c;
    const [x0, y0, x1, y1, x2, y2, x3, y3, x4, y4] = other.c;
    return new Jet([
      a0 + s * x0,
      b0 + s * y0,
      a1 + s * x1,
      b1 + s * y1,
      a2 + s * x2,
      b2 + s * y2,
      a3 + s * x3,
      b3 + s * y3,
      a4 + s * x4,
      b4 + s * y4,
    ]);
  }
}

type Ten = readonly [number, number, number, number, number, number, number, number, number, number];
