"""Scattering parameters of coupling matrices at 40 digits.

Standard input: JSON list of {"values": [[...]], "omega": [...]}, values = full (N+2) x (N+2) rows of doubles,
index 0 = source, N+1 = load. Standard output: JSON list of
{"s11": {"re": [...], "im": [...]}, "s21": ..., "s12": ..., "s22": ..., "residual": r}.

A = M + omega U - j R, U = 1 on the resonators, R = 1 on source and load;
S11 = -1 - 2j [A^-1](0,0), S21 = -2j [A^-1](N+1,0), S12 = -2j [A^-1](0,N+1), S22 = -1 - 2j [A^-1](N+1,N+1).

Gaussian elimination with partial pivoting on fixed-point integers (BITS binary places, complex as two integers:
doubles enter exactly, the rest keeps about 90 places); zeros of sparse matrices are skipped. The residual
max |A x - b| is computed from the untouched A and must stay below 1e-60.
"""

import json
import sys
from fractions import Fraction

from mpmath import mp, mpf

BITS = 320
HALF = 1 << (BITS - 1)
ONE = 1 << BITS
DIGITS = 40


def fixed(x):
    """A double as a fixed-point integer; exact unless it is below 2^-267."""
    value = Fraction(x) * ONE
    return value.numerator // value.denominator


def product(ar, ai, br, bi):
    return (ar * br - ai * bi) >> BITS, (ar * bi + ai * br) >> BITS


def quotient(ar, ai, br, bi):
    size = br * br + bi * bi
    return ((ar * br + ai * bi) << BITS) // size, ((ai * br - ar * bi) << BITS) // size


def assemble(values, omega):
    n = len(values)
    re = [[fixed(x) for x in row] for row in values]
    im = [[0] * n for _ in range(n)]
    shift = fixed(omega)
    for i in range(1, n - 1):
        re[i][i] += shift
    im[0][0] -= ONE
    im[n - 1][n - 1] -= ONE
    return re, im


def solve(re, im):
    """First and last column of the inverse, as lists of pairs."""
    n = len(re)
    ar, ai = [row + [0, 0] for row in re], [row + [0, 0] for row in im]
    ar[0][n] = ONE
    ar[n - 1][n + 1] = ONE
    for k in range(n):
        best = max(range(k, n), key=lambda r: ar[r][k] * ar[r][k] + ai[r][k] * ai[r][k])
        if best != k:
            ar[k], ar[best] = ar[best], ar[k]
            ai[k], ai[best] = ai[best], ai[k]
        pr, pi = ar[k][k], ai[k][k]
        if pr == 0 and pi == 0:
            raise ZeroDivisionError("the matrix A is singular")
        kr, ki = ar[k], ai[k]
        live = [c for c in range(k + 1, n + 2) if kr[c] or ki[c]]
        for r in range(k + 1, n):
            rr, ri = ar[r], ai[r]
            if not (rr[k] or ri[k]):
                continue
            fr, fi = quotient(rr[k], ri[k], pr, pi)
            if fi:
                for c in live:
                    x, y = kr[c], ki[c]
                    rr[c] -= (fr * x - fi * y) >> BITS
                    ri[c] -= (fr * y + fi * x) >> BITS
            else:
                for c in live:
                    rr[c] -= (fr * kr[c]) >> BITS
                    if ki[c]:
                        ri[c] -= (fr * ki[c]) >> BITS
    columns = []
    for b in (n, n + 1):
        x = [(0, 0)] * n
        for k in range(n - 1, -1, -1):
            sr, si = ar[k][b], ai[k][b]
            for c in range(k + 1, n):
                if ar[k][c] or ai[k][c]:
                    tr, ti = product(ar[k][c], ai[k][c], *x[c])
                    sr -= tr
                    si -= ti
            x[k] = quotient(sr, si, ar[k][k], ai[k][k])
        columns.append(x)
    return columns


def residual(re, im, columns):
    n = len(re)
    worst = 0
    for x, unit in zip(columns, (0, n - 1)):
        for i in range(n):
            sr, si = (-ONE if i == unit else 0), 0
            for c in range(n):
                if re[i][c] or im[i][c]:
                    tr, ti = product(re[i][c], im[i][c], *x[c])
                    sr += tr
                    si += ti
            worst = max(worst, abs(sr), abs(si))
    return worst


def number(x):
    """Fixed-point integer -> JSON number."""
    with mp.workdps(DIGITS):
        value = mpf(x) / ONE
        return "0" if x == 0 else mp.nstr(value, DIGITS).removesuffix(".0")


def evaluate(item):
    values, frequencies = item["values"], item["omega"]
    n = len(values)
    if n < 2 or any(len(row) != n for row in values):
        raise ValueError("values must be a full square array")
    names = ("s11", "s21", "s12", "s22")
    out = {name: ([], []) for name in names}
    worst = 0
    for omega in frequencies:
        re, im = assemble(values, omega)
        first, last = solve(re, im)
        worst = max(worst, residual(re, im, (first, last)))
        # -2j (x + j y) = 2 y - 2j x
        for name, (x, y), shift in (("s11", first[0], -ONE), ("s21", first[n - 1], 0),
                                    ("s12", last[0], 0), ("s22", last[n - 1], -ONE)):
            out[name][0].append(number(2 * y + shift))
            out[name][1].append(number(-2 * x))
    with mp.workdps(DIGITS):
        size = mpf(worst) / ONE
        if size > mpf(10) ** -60:
            raise ArithmeticError("residual " + mp.nstr(size, 3))
        parts = ['"%s":{"re":[%s],"im":[%s]}' % (name, *map(",".join, out[name])) for name in names]
        return "{" + ",".join(parts) + ',"residual":' + mp.nstr(size, 3) + "}"


def main():
    items = json.load(sys.stdin)
    print("[" + ",\n".join(evaluate(item) for item in items) + "]")


if __name__ == "__main__":
    main()
