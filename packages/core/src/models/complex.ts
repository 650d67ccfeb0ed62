/** Complex numbers, as far as the damped models need them. */
export interface Complex {
  re: number;
  im: number;
}

export function complex(re: number, im = 0): Complex {
  return { re, im };
}

export function add(...terms: Complex[]): Complex {
  return terms.reduce((sum, { re, im }) => ({ re: sum.re + re, im: sum.im + im }), complex(0));
}

export function multiply(...factors: Complex[]): Complex {
  return factors.reduce(
    (product, { re, im }) => ({ re: product.re * re - product.im * im, im: product.re * im + product.im * re }),
    complex(1),
  );
}

export function scale(z: Complex, factor: number): Complex {
  return { re: z.re * factor, im: z.im * factor };
}

export function divide(a: Complex, b: Complex): Complex {
  const square = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / square, im: (a.im * b.re - a.re * b.im) / square };
}

/** Root of non-negative real part. */
export function squareRoot(z: Complex): Complex {
  const size = Math.hypot(z.re, z.im);
  const re = Math.sqrt((size + Math.abs(z.re)) / 2);
  if (re === 0) return complex(0);
  const im = z.im / (2 * re);
  if (z.re >= 0) return { re, im };
  return { re: Math.abs(im), im: z.im < 0 ? -re : re };
}

export function exponential({ re, im }: Complex): Complex {
  return { re: Math.exp(re) * Math.cos(im), im: Math.exp(re) * Math.sin(im) };
}

export function sine({ re, im }: Complex): Complex {
  return { re: Math.sin(re) * Math.cosh(im), im: Math.cos(re) * Math.sinh(im) };
}

export function cosine({ re, im }: Complex): Complex {
  return { re: Math.cos(re) * Math.cosh(im), im: -Math.sin(re) * Math.sinh(im) };
}

/** Determinant by elimination with partial pivoting; the matrix is used up. */
export function determinant(matrix: Complex[][]): Complex {
  let product = complex(1);
  for (let k = 0; k < matrix.length; k++) {
    let best = k;
    for (let i = k + 1; i < matrix.length; i++) {
      if (Math.hypot(matrix[i]![k]!.re, matrix[i]![k]!.im) > Math.hypot(matrix[best]![k]!.re, matrix[best]![k]!.im)) best = i;
    }
    if (best !== k) {
      [matrix[k], matrix[best]] = [matrix[best]!, matrix[k]!];
      product = scale(product, -1);
    }
    const pivot = matrix[k]![k]!;
    product = multiply(product, pivot);
    for (let i = k + 1; i < matrix.length; i++) {
      const factor = scale(divide(matrix[i]![k]!, pivot), -1);
      for (let j = k + 1; j < matrix.length; j++) matrix[i]![j] = add(matrix[i]![j]!, multiply(factor, matrix[k]![j]!));
    }
  }
  return product;
}
