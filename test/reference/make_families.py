"""Many-digit roots of the classical families: Butterworth, inverse Chebyshev, elliptic, Bessel.

Route (not the library's): filtering functions as expanded polynomials with many digits, poles as roots of
f/epsilonR + j p/epsilon moved into the left half plane (elliptic, inverse Chebyshev), of the reverse Bessel
polynomial, or of 1 + w^(2N) (Butterworth). Reflection zeros of the Bessel family: roots of
theta(s) theta(-s) - theta(0)^2, multiplied out. Elliptic zeros from mpmath's own elliptic functions; the modulus
that belongs to a rejection by halving on the degree equation.

    make_families.py build            everything -> fixtures/reference/families.json
    make_families.py remake 0 7 ...   single cases computed again -> standard output
"""

import json
import os
import sys

from mpmath import mp, mpc, mpf
import mpmath

HERE = os.path.dirname(os.path.abspath(__file__))
STORE = os.path.normpath(os.path.join(HERE, "..", "..", "fixtures", "reference", "families.json"))
DIGITS = 20


def cases():
    out = [{"family": "butterworth", "order": n} for n in (1, 2, 3, 8, 17, 40)]
    for n, rl, rej in ((1, 20, 30), (2, 20, 40), (3, 15, 35), (4, 26, 60), (7, 0.5, 90), (10, 22, 80), (21, 3, 50), (40, 30, 120)):
        out.append({"family": "inverseChebyshev", "order": n, "returnLossDb": rl, "rejectionDb": rej})
    for n, rl, rej in ((1, 20, 30), (2, 20, 40), (3, 20, 24), (4, 26, 60), (5, 20, 50), (6, 15, 90), (9, 22, 120), (12, 40, 60), (20, 20, 100), (31, 0.1, 150), (40, 20, 120), (40, 26, 300)):
        out.append({"family": "elliptic", "order": n, "returnLossDb": rl, "rejectionDb": rej})
    for n, rl, edge in ((2, 20, 3), (3, 16.4, 2), (4, 20, 1.05), (5, 20, 1.001), (7, 26, 1.5), (8, 0.05, 1.2), (15, 22, 1.01), (40, 20, 1.0001), (40, 3, 1.003)):
        out.append({"family": "elliptic", "order": n, "returnLossDb": rl, "stopBandEdge": edge})
    for n, rl, key, value in ((2, 20, "rejectionDb", 30), (4, 26, "rejectionDb", 60), (6, 20, "stopBandEdge", 1.2), (8, 15, "stopBandEdge", 1.02), (20, 20, "rejectionDb", 110), (40, 22, "stopBandEdge", 1.001)):
        out.append({"family": "elliptic", "order": n, "returnLossDb": rl, key: value, "largestPairAtInfinity": True})
    for n in (1, 2, 3, 4, 5, 8, 13, 20, 30, 40):
        for edge in ("halfPower", "unitDelay"):
            out.append({"family": "bessel", "order": n, "edge": edge})
    # Levels at both ends of their ranges.
    for n, rl, rej in ((1, 100, 150), (3, 60, 300), (6, 60, 80), (6, 100, 1), (7, 0.01, 200), (15, 100, 150), (12, 40, 3)):
        for family in ("elliptic", "inverseChebyshev"):
            out.append({"family": family, "order": n, "returnLossDb": rl, "rejectionDb": rej})
    return out


def from_roots(roots):
    out = [mpc(1)]
    for r in roots:
        out = [mpc(0)] + out
        for i in range(len(out) - 1):
            out[i] -= r * out[i + 1]
    return out


def roots_of(ascending):
    if len(ascending) < 2:
        return []
    return mpmath.polyroots([c for c in reversed(ascending)], maxsteps=2000, extraprec=mp.prec)


def by_frequency(roots):
    return sorted(roots, key=lambda r: (-mpmath.nint(r.imag * mpf(10) ** 30), r.real))


def poles_of(zeros, transmission, constants):
    """s-plane poles from real zeros of f and p, omega plane."""
    f = from_roots(zeros)
    p = from_roots(transmission)
    epsilon, epsilon_r = constants
    whole = [c / epsilon_r for c in f]
    for i, c in enumerate(p):
        whole[i] += mpc(0, 1) * c / epsilon
    poles = []
    for w in roots_of(whole):
        s = mpc(0, 1) * w
        poles.append(mpc(-abs(s.real), s.imag))
    return by_frequency(poles)


def kappa_of(rl):
    return mpmath.sqrt(mpf(10) ** (mpf(rl) / 10) - 1)


def constants_of(zeros, transmission, kappa):
    ratio = mpf(1) / kappa
    for z in transmission:
        ratio *= abs(z - 1)
    for z in zeros:
        ratio /= abs(1 - z)
    if len(transmission) < len(zeros):
        return ratio, mpf(1)
    epsilon = mpmath.sqrt(1 + ratio ** 2)
    return epsilon, epsilon / ratio


def period_ratio(k):
    """K'/K."""
    return mpmath.ellipk(1 - k * k) / mpmath.ellipk(k * k)


def halved(function, low, high):
    """The root of a falling function of x = log10(1 - k) or the like, by halving."""
    for _ in range(int(mp.prec) + 20):
        middle = (low + high) / 2
        if function(middle) > 0:
            low = middle
        else:
            high = middle
    return (low + high) / 2


def cd(part, k):
    return mpmath.ellipfun("cd", part * mpmath.ellipk(k * k), k=k).real


def elliptic_roots(case):
    n = case["order"]
    kappa = kappa_of(case["returnLossDb"])
    moved = case.get("largestPairAtInfinity", False)
    # k is written as q-like variable: nome by halving on its logarithm.
    if "rejectionDb" in case:
        k1 = 1 / (kappa * mpmath.sqrt(mpf(10) ** (mpf(case["rejectionDb"]) / 10) - 1))
        wanted = period_ratio(k1) / n
        q = mpmath.exp(-mp.pi * wanted)
        k = mpmath.kfrom(q=q)
    else:
        edge = mpf(case["stopBandEdge"])
        if not moved:
            k = 1 / edge
        else:
            # stop band after the move starts where the unmoved one has its innermost zero's place
            def off(x):
                kk = 1 / (1 + mpmath.exp(x))
                return edge - moved_edge(kk, n)
            k = 1 / (1 + mpmath.exp(halved(off, mpf(-40), mpf(10))))
    zeros = [cd(mpf(2 * i - 1) / n, k) for i in range(1, n // 2 + 1)]
    transmission = [1 / (k * z) for z in zeros]
    if moved:
        b = 1 / transmission[-1] ** 2
        send = lambda w: w * mpmath.sqrt(abs((1 - b) / (1 - b * w * w)))
        zeros = [send(z) for z in zeros]
        transmission = [send(z) for z in transmission[:-1]]
    both = lambda list_: [-z for z in list_] + list_
    return both(zeros) + ([mpf(0)] if n % 2 else []), both(transmission), kappa


def moved_edge(k, n):
    b = (k * cd(mpf(n - 1) / n, k)) ** 2
    x = 1 / k ** 2
    return mpmath.sqrt(x * (1 - b) / (1 - b * x))


def bessel_coefficients(n):
    f = mpmath.factorial
    return [f(2 * n - k) / (mpf(2) ** (n - k) * f(k) * f(n - k)) for k in range(n + 1)]


def bessel_roots(n, edge):
    theta = bessel_coefficients(n)
    product = [mpf(0)] * (2 * n + 1)
    for i, a in enumerate(theta):
        for k, b in enumerate(theta):
            product[i + k] += a * b * (-1) ** k
    even = product[2::2]  # theta(s) theta(-s) - theta(0)^2 over s^2, in y = s^2
    reflection = [mpc(0)] + [-mpmath.sqrt(y) for y in roots_of(even)]
    scale = mpf(1)
    if edge == "halfPower":
        power = lambda w: sum(c * (-w * w) ** k for k, c in enumerate(product[::2])).real / theta[0] ** 2
        scale = halved(lambda w: 2 - power(w), mpf(0), mpf(4 * n))
    poles = [p / scale for p in roots_of(theta)]
    return by_frequency(poles), by_frequency([r / scale for r in reflection]), scale


def compute(case):
    n = case["order"]
    mp.dps = 60 + 5 * n
    family = case["family"]
    extra = {}
    if family == "butterworth":
        poles = [mpmath.expj(mp.pi * mpf(2 * k + n - 1) / (2 * n)) for k in range(1, n + 1)]
        poles, reflection, transmission, constants = by_frequency(poles), [mpc(0)] * n, [], (mpf(1), mpf(1))
    elif family == "bessel":
        poles, reflection, scale = bessel_roots(n, case["edge"])
        transmission, constants = [], (1 / mpmath.fprod(abs(p) for p in poles), mpf(1))
        extra["halfPowerOmega"] = text(scale) if case["edge"] == "halfPower" else None
    else:
        if family == "elliptic":
            zeros, transmission, kappa = elliptic_roots(case)
        else:
            kappa = kappa_of(case["returnLossDb"])
            ratio = mpmath.sqrt(mpf(10) ** (mpf(case["rejectionDb"]) / 10) - 1)
            edge = mpmath.cosh(mpmath.acosh(kappa * ratio) / n)
            chebyshev = chebyshev_polynomial(n)
            odd = n % 2
            inner = roots_of([mpf(c) for c in chebyshev[odd:]])
            zeros, transmission = [mpf(0)] * n, [edge / x.real for x in inner]
        constants = constants_of(zeros, transmission, kappa)
        poles = poles_of(zeros, transmission, constants)
        reflection = [mpc(0, z) for z in sorted(zeros, reverse=True)]
        transmission = sorted(transmission, reverse=True)
        check_power(poles, reflection, transmission, constants)
    return {
        **case,
        "poles": columns(poles),
        "reflectionZeros": columns(reflection),
        "transmissionZeros": [text(z) for z in transmission],
        "epsilon": text(constants[0]),
        "epsilonR": text(constants[1]),
        **{key: value for key, value in extra.items() if value is not None},
    }


def chebyshev_polynomial(n):
    before, now = [1], [0, 1]
    for _ in range(n - 1):
        following = [0] + [2 * c for c in now]
        for i, c in enumerate(before):
            following[i] -= c
        before, now = now, following
    return now


def check_power(poles, reflection, transmission, constants):
    """|S11|^2 + |S21|^2 = 1 at a few frequencies, to 40 digits."""
    for w in (mpf(0), mpf("0.37"), mpf("0.99"), mpf(1), mpf("1.3"), mpf(4)):
        s = mpc(0, w)
        e = mpmath.fprod(abs(s - p) for p in poles)
        f = mpmath.fprod(abs(s - r) for r in reflection)
        p = mpmath.fprod(abs(w - z) for z in transmission)
        off = abs((f / (e * constants[1])) ** 2 + (p / (e * constants[0])) ** 2 - 1)
        if off > mpf(10) ** -40:
            raise ValueError("power balance off by %s" % mpmath.nstr(off, 5))


def text(x):
    return mpmath.nstr(x, DIGITS, min_fixed=1, max_fixed=0)


def columns(roots):
    return {"re": [text(r.real) for r in roots], "im": [text(r.imag) for r in roots]}


def line(case):
    return json.dumps(compute(case), separators=(",", ":"))


def main():
    mode = sys.argv[1] if len(sys.argv) > 1 else ""
    listed = cases()
    if mode == "remake":
        for index in sys.argv[2:]:
            print(line(listed[int(index)]))
    elif mode == "build":
        lines = [line(case) for case in listed]
        with open(STORE, "w") as out:
            out.write("[\n" + ",\n".join(lines) + "\n]\n")
    else:
        sys.exit(__doc__)


if __name__ == "__main__":
    main()
