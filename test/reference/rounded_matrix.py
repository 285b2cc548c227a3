"""What the best transversal matrix of doubles gives: every entry of the exact one rounded to the nearest double.

    python3 test/reference/rounded_matrix.py 114 173        ids of fixtures/reference/reference.json

Prints, for each id, the worst error of complex S11 and S21 over the first 100 frequencies, of the exact matrix (a check of
this script: rounding noise of 20-digit data) and of the rounded one. No method that returns doubles can promise less.

Route: S11 + S21 and S11 - S21 are all-pass with the poles where F/epsilonR = +P/epsilon and -P/epsilon; their resonances
solve sum(arg(j*omega - p)) = -(n-1)*pi/2 + k*pi, found by bisection and Newton at 40 digits. Not for as many finite zeros
as the order.
"""

import json
import os
import sys

from mpmath import atan2, mp, mpc, mpf, nstr, pi, sqrt

HERE = os.path.dirname(os.path.abspath(__file__))
STORE = os.path.normpath(os.path.join(HERE, "..", "..", "fixtures", "reference", "reference.json"))
POINTS = 100


def number(text):
    return mpf(str(text))


def column(pair):
    return [mpc(number(re), number(im)) for re, im in zip(pair["re"], pair["im"])]


def modes(spec):
    """Poles of S11 + S21 and of S11 - S21."""
    lead = mpc(number(spec["leading"]["re"]), number(spec["leading"]["im"]))
    zeros = [mpc(mpf(float(z["re"])), mpf(float(z["im"]))) if isinstance(z, dict) else mpc(0, mpf(float(z)))
             for z in spec["transmissionZeros"]]
    even, odd = [], []
    for pole in column(spec["poles"]):
        f = 1 / number(spec["epsilonR"])
        for w in spec["reflectionZeros"]:
            f *= pole - mpc(0, number(w))
        p = lead / number(spec["epsilon"])
        for z in zeros:
            p *= pole - z
        (even if (f / p).real > 0 else odd).append(pole)
    return even, odd


def resonances(poles):
    """(lambda, load coupling) of one mode."""
    found = []
    for k in range(len(poles)):
        target = (k - mpf(len(poles) - 1) / 2) * pi
        low, high = mpf(-2000), mpf(2000)
        for _ in range(45):
            middle = (low + high) / 2
            if sum(atan2(middle - p.imag, -p.real) for p in poles) < target:
                low = middle
            else:
                high = middle
        x = (low + high) / 2
        for _ in range(6):
            slope = sum(-p.real / (p.real ** 2 + (x - p.imag) ** 2) for p in poles)
            x -= (sum(atan2(x - p.imag, -p.real) for p in poles) - target) / slope
        slope = sum(-p.real / (p.real ** 2 + (x - p.imag) ** 2) for p in poles)
        found.append((x, sqrt(1 / (2 * slope))))
    return found


def response(even, odd, w):
    def mode(terms):
        x = -sum(2 * m * m / (w - l) for l, m in terms)
        return -(x + mpc(0, 1)) / (x - mpc(0, 1))
    a, b = mode(even), mode(odd)
    return (a + b) / 2, (a - b) / 2


def rounded(terms):
    return [(mpf(float(l)), mpf(float(m))) for l, m in terms]


def worst(even, odd, spec):
    right = list(zip(column(spec["s11"]), column(spec["s21"])))
    errors = []
    for w, (s11, s21) in list(zip(spec["omega"], right))[:POINTS]:
        a, b = response(even, odd, mpf(float(w)))
        errors.append((max(abs(a - s11), abs(b - s21)), float(w)))
    return max(errors)


def main():
    mp.dps = 40
    with open(STORE, encoding="ascii") as file:
        specs = json.load(file, parse_float=lambda text: text)["specs"]
    for spec_id in map(int, sys.argv[1:]):
        spec = specs[spec_id]
        even, odd = (resonances(poles) for poles in modes(spec))
        exact, _ = worst(even, odd, spec)
        error, omega = worst(rounded(even), rounded(odd), spec)
        print("id %d, order %d: exact matrix %s, rounded matrix %s at omega = %.9f"
              % (spec_id, spec["order"], nstr(exact, 3), nstr(error, 3), omega))


if __name__ == "__main__":
    main()
