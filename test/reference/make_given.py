"""Sixty-digit references of spectral factorization: predistorted all-pole responses, and responses from |S21|^2 by roots.

    python3 test/reference/make_given.py > fixtures/reference/given.json

Seed 20261207; only random.Random(seed).random() is drawn. Method, on none of the library's ways: the sum
|E(jw)|^2 - c^2 |P(jw)|^2 is expanded in omega with 120 digits; its constant is the largest that keeps it from falling
below zero, found at the real roots of the derivative of |P|^2/|E|^2; the double root there is divided out exactly, and the
rest is solved by mpmath.polyroots.
"""
import json
import random

from mpmath import mp, mpc, mpf, polyroots

mp.dps = 120


def times(a, b):
    out = [mpc(0)] * (len(a) + len(b) - 1)
    for i, x in enumerate(a):
        for k, y in enumerate(b):
            out[i + k] += x * y
    return out


def power(roots):
    """Descending coefficients in omega of prod |j w - r|^2 = prod ((w - im)^2 + re^2)."""
    out = [mpc(1)]
    for r in roots:
        out = times(out, [mpc(1), -2 * mpf(r.imag), mpf(r.imag) ** 2 + mpf(r.real) ** 2])
    return [mpf(c.real) for c in out]


def derivative(c):
    n = len(c) - 1
    return [x * (n - k) for k, x in enumerate(c[:-1])]


def value(c, x):
    total = mpf(0)
    for a in c:
        total = total * x + a
    return total


def add(a, b, factor):
    n = max(len(a), len(b))
    a = [mpf(0)] * (n - len(a)) + list(a)
    b = [mpf(0)] * (n - len(b)) + list(b)
    return [x + factor * y for x, y in zip(a, b)]


def trimmed(c):
    k = 0
    while k < len(c) - 1 and abs(c[k]) < mpf(10) ** -90:
        k += 1
    return c[k:]


def solve(c):
    return polyroots(trimmed(c), maxsteps=2000, extraprec=400)


def drawn(rng, order, zeros):
    poles = []
    for k in range(order):
        poles.append(complex(-0.05 - 0.6 * rng.random(), -1 + 2 * (k + rng.random()) / order))
    finite = [complex(0, (1 if rng.random() < 0.5 else -1) * (1.2 + 2 * rng.random())) for _ in range(zeros)]
    return poles, finite


def made(rng, order, zeros):
    poles, finite = drawn(rng, order, zeros)
    e, p = power(poles), power(finite)
    # (p/e)' = 0; p is a square, whose double roots are minima and left out by the choice of the largest.
    slope = add([mpf(c.real) for c in times(derivative(p) or [mpf(0)], e)],
                [mpf(c.real) for c in times(p, derivative(e))], -1)
    real = [mpf(w.real) for w in solve(slope) if abs(mpc(w).imag) < mpf(10) ** -40]
    best = max(real, key=lambda w: value(p, w) / value(e, w))
    square = value(e, best) / value(p, best)
    rest = add(e, p, -square)
    for _ in range(2):  # Horner's scheme divides by (w - best)
        quotient = [rest[0]]
        for c in rest[1:]:
            quotient.append(c + quotient[-1] * best)
        assert abs(quotient[-1]) < mpf(10) ** -60
        rest = quotient[:-1]
    # The other roots, those above the axis: s = j w lies on the left.
    roots = [mpc(0, best)] + [mpc(-w.imag, w.real) for w in map(mpc, solve(rest)) if w.imag > mpf(10) ** -40]
    assert len(roots) == order, len(roots)
    roots.sort(key=lambda r: -r.imag)
    text = lambda x: mp.nstr(x, 60)
    return {
        "order": order,
        "poles": [[p.real, p.imag] for p in poles],
        "transmissionZeros": [p.imag for p in finite],
        "epsilon": text(1 / mp.sqrt(square)),
        "reflectionZeros": [[text(r.real), text(r.imag)] for r in roots],
    }


def main():
    rng = random.Random(20261207)
    rows = [made(rng, order, zeros) for order, zeros in
            [(n, z) for n in range(1, 13) for z in (0, n // 2) if z < n]]
    print("[\n" + ",\n".join(json.dumps(row) for row in rows) + "\n]")


if __name__ == "__main__":
    main()
