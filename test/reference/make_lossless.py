"""Many-digit reference responses of general lossless reciprocal two-ports, S11 different from S22.

Two routes, both through expanded polynomials in w = omega (s = j w), which the library never uses:
  factored   reflection and transmission zeros are drawn as doubles; the poles are the roots in the upper half plane of w
             (left in s) of the expanded |F|^2/epsilonR^2 + |P|^2/epsilon^2 (spectral factorization);
  network    a transversal network is drawn (resonances and port couplings as doubles), E, F and P are the expanded
             numerators and denominator of its S, all roots found from their coefficients.
Roots: Ehrlich-Aberth and Newton with disjoint disks, as in make_reference.py. S is evaluated from the product form before
any rounding; S22 = prod(s + conj f)/(epsilonR E). `floor` is the change of S when all roots and both constants are rounded
to doubles: what no method that starts from those doubles can promise to undercut.

    make_lossless.py build              everything -> fixtures/reference/lossless.json
    make_lossless.py remake 3 17 ...    single cases computed again -> standard output, one a line
"""

import json
import os
import random
import sys

from mpmath import mp, mpc, mpf

from make_reference import ReferenceFault, UNITS, aberth, leading_constant, plus, polish, require, text, times_linear

HERE = os.path.dirname(os.path.abspath(__file__))
STORE = os.path.normpath(os.path.join(HERE, "..", "..", "fixtures", "reference", "lossless.json"))
SEED = 20261204
ORDERS = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 12, 14, 16, 18, 20, 24, 28, 32, 36, 40]
STYLES = ["left", "right", "mixed", "pairs", "canonical"]
SHIFTS = [1e-8, 1e-3, 0.05, 0.15, 0.5]
POINTS = 24
REMAKE_IDS = [0, 13, 26, 39, 111, 114, 117, 120, 123]


def digits_for(order):
    return 100 + 9 * order


# ---------------------------------------------------------------- what is drawn

def drawn_zeros(rng, count, style):
    """Finite transmission zeros in s: numbers on the axis, pairs mirrored in it."""
    zeros = []
    while len(zeros) < count:
        if style in ("pairs", "canonical") and rng.random() < (0.7 if style == "pairs" else 0.3) and len(zeros) + 2 <= count:
            re, im = 0.1 + 1.5 * rng.random(), 0.0 if rng.random() < 0.2 else 2.4 * rng.random() - 1.2
            zeros += [complex(re, im), complex(-re, im)]
        else:
            zeros.append(complex(0, (1 if rng.random() < 0.5 else -1) * (1 + 0.02 * 200 ** rng.random())))
    return zeros


def drawn_reflection(rng, order, style, shift):
    out = []
    for k in range(order):
        im = float(mp.cos((2 * k + 1) * mp.pi / (2 * order))) * (1 - 0.5 * rng.random() / order ** 2)
        side = {"left": -1, "right": 1}.get(style, -1 if rng.random() < 0.5 else 1)
        if style == "mixed" and rng.random() < 0.2:
            side = 0
        out.append(complex(side * shift * (0.2 + rng.random()) / order ** 0.5, im))
    return out


def factored(rng, order, style, shift, scale=1.0):
    count = order if style == "canonical" else min(order - 1, int((order + 1) * rng.random() * 0.7))
    return {
        "kind": "factored", "style": style, "order": order, "scale": scale,
        "zeros": [z * scale for z in drawn_zeros(rng, count, style)],
        "reflection": [f * scale for f in drawn_reflection(rng, order, style, shift)],
        "level": 3 + 37 * rng.random(), "flip": 2 * int(2 * rng.random()),
    }


def special(rng):
    """Repeated reflection zeros, scaled frequencies, transmission zeros inside the band."""
    out = []
    for order in (5, 20, 40):
        case = factored(rng, order, "left", 0.1)
        case.update(style="repeated", reflection=[complex(-0.1, 0.2)] * order, zeros=[complex(0, 2.5)], level=5.0)
        out.append(case)
    for scale in (1e6, 2.0 ** -30):
        case = factored(rng, 8, "mixed", 0.15, scale)
        case["style"] = "scaled"
        out.append(case)
    for inside in (0.3, -0.55):
        case = factored(rng, 9, "mixed", 0.15)
        case.update(style="inside", zeros=[complex(0, inside), complex(0, 1.7)])
        out.append(case)
    return out


def network(style, lambdas, source, load, direct=0.0):
    return {"kind": "network", "style": style, "order": len(lambdas), "lambdas": lambdas, "source": source, "load": load,
            "direct": direct, "scale": 1.0}


def networks(rng):
    """Hard ones: eigenvalues close together or equal, narrow on wide, resonators that one port does not see."""
    def couplings(n, low=0.2, high=0.7):
        return [(1 if rng.random() < 0.5 else -1) * (low + (high - low) * rng.random()) for _ in range(n)]

    def spread(n):
        return [2 * (k + 0.5 * rng.random()) / n - 1 for k in range(n)]

    out = []
    for gap in (1e-3, 1e-7, 1e-12, 0.0):
        for place in (0, 4):
            lambdas = spread(8)
            lambdas[place + 1] = lambdas[place] + gap
            out.append(network("gap %g" % gap, lambdas, couplings(8), couplings(8)))
    for narrow in (1e-2, 1e-3):
        lambdas, source, load = spread(6), couplings(6), couplings(6)
        lambdas[2], lambdas[3] = 0.7, 0.7
        source[2], load[2], source[3], load[3] = 1.0, 0.8, 0.6 * narrow, -0.9 * narrow
        out.append(network("narrow %g on wide" % narrow, lambdas, source, load))
    lambdas = [0.08 * k - 0.4 + 0.02 * rng.random() for k in range(10)] + [0.0]
    out.append(network("ten narrow under one wide", lambdas, [0.05 + 0.05 * rng.random() for _ in range(10)] + [0.01],
                       [0.004 * rng.random() for _ in range(10)] + [1.0]))
    out.append(network("canonical", spread(12), couplings(12), couplings(12), 0.15))
    for n in (6, 12, 20):
        out.append(network("random", spread(n), couplings(n, 0.05, 0.6), couplings(n, 0.05, 0.6)))
    lambdas, source, load = spread(7), couplings(7), couplings(7)
    source[1], load[3], source[5] = 0.0, 0.0, 0.0
    out.append(network("one port only", lambdas, source, load))
    lambdas = list(lambdas)
    lambdas[3] = lambdas[1]
    out.append(network("one port only, equal eigenvalues", lambdas, source, load))
    return out


def cases():
    rng = random.Random(SEED)
    out = [factored(rng, n, style, SHIFTS[(i + j) % len(SHIFTS)])
           for i, n in enumerate(ORDERS) for j, style in enumerate(STYLES)]
    out += special(rng) + networks(rng)
    for i, case in enumerate(out):
        case["id"] = i
        case["dice"] = [rng.random() for _ in range(3 * POINTS)]
    return out


# ---------------------------------------------------------------- polynomials in w

def on_w(s):
    """Root in s to root in w = -j s."""
    s = mpc(s)
    return mpc(s.imag, -s.real)


def from_roots(roots):
    out = [mpc(1)]
    for r in roots:
        out = times_linear(out, r)
    return out


def times(a, b):
    out = [mpc(0)] * (len(a) + len(b) - 1)
    for i, x in enumerate(a):
        for k, y in enumerate(b):
            out[i + k] += x * y
    return out


def roots_of(coefficients, starts, label):
    if len(coefficients) == 1:
        return []
    found = aberth(coefficients, starts, max(60, mp.dps // 2))
    return polish(coefficients, found, label)[0]


def circle(n, radius=0.9):
    return [radius * complex(mp.cos(2 * mp.pi * k / n + 0.3), mp.sin(2 * mp.pi * k / n + 0.3)) for k in range(n)]


def s_plane(w):
    return mpc(-w.imag, w.real)


class Response:
    """Roots in s, constants, at the current precision."""

    def __init__(self, poles, reflection, zeros, lead, epsilon, epsilon_r):
        self.poles, self.reflection, self.zeros = poles, reflection, zeros
        self.lead, self.epsilon, self.epsilon_r = lead, epsilon, epsilon_r

    def at(self, w):
        s = mpc(0, w)
        e, f, mirrored, p = mpc(1), mpc(1), mpc(1), mpc(self.lead)
        for root in self.poles:
            e *= s - root
        for root in self.reflection:
            f *= s - root
            mirrored *= s + root.conjugate()
        for root in self.zeros:
            p *= s - root
        return f / (self.epsilon_r * e), p / (self.epsilon * e), mirrored / (self.epsilon_r * e)

    def rounded(self):
        def double(x):
            return mpf(float(mp.nstr(x, 20)))

        def both(roots):
            return [mpc(double(r.real), double(r.imag)) for r in roots]

        return Response(both(self.poles), both(self.reflection), both(self.zeros), self.lead, double(self.epsilon),
                        double(self.epsilon_r))


def from_factors(case):
    # Scaled frequencies are a change of unit: everything is found in the unit 1.
    order, unit = case["order"], mpf(case["scale"])
    zeros = [mpc(z) / unit for z in case["zeros"]]
    reflection = [mpc(f) / unit for f in case["reflection"]]
    f, p = from_roots(map(on_w, reflection)), from_roots(map(on_w, zeros))
    at_edge = [abs(sum(c)) for c in (f, p)]
    k = at_edge[1] / at_edge[0] / mp.sqrt(mp.power(10, mpf(case["level"]) / 10) - 1)
    full = len(zeros) == order
    epsilon = mp.sqrt(1 + k * k) if full else k
    epsilon_r = epsilon / k if full else mpf(1)
    g = plus([c / epsilon_r ** 2 for c in times(f, [c.conjugate() for c in f])],
             [c / epsilon ** 2 for c in times(p, [c.conjugate() for c in p])])
    g = [mpc(c.real) for c in g]
    lift = 0.6 / order + 0.03
    wobble = [complex(on_w(r)) for r in reflection]
    if len(set(wobble)) < order:
        wobble = [z + 0.4 * complex(mp.expj(6.28 * i / order)) for i, z in enumerate(wobble)]
    starts = [complex(z.real, sign * (lift + 0.001 * i)) for i, z in enumerate(wobble) for sign in (1, -1)]
    roots = [w for w in roots_of(g, starts, "case %d" % case["id"]) if w.imag > 0]
    require(len(roots) == order, "the roots do not split evenly")
    axis = [w.real if w.imag == 0 else w for w in map(on_w, zeros)]
    power = (leading_constant(order, axis) + case["flip"]) % 4
    degree = len(zeros)
    poles = sorted((s_plane(w) for w in roots), key=lambda s: s.imag)
    return Response([s * unit for s in poles], [mpc(s) for s in case["reflection"]], [mpc(s) for s in case["zeros"]],
                    UNITS[power], epsilon * mp.power(unit, degree - order), epsilon_r)


def trimmed(coefficients):
    size = max(abs(c) for c in coefficients)
    while abs(coefficients[-1]) < size * mpf(10) ** (10 - mp.dps):
        coefficients = coefficients[:-1]
    return coefficients


def from_network(case):
    """D = prod(w + lambda); D*X and D*det X of the port matrix X = [[-j, B], [B, -j]] - sum m m^T/(w + lambda), expanded."""
    n, b = case["order"], mpf(case["direct"])
    lam, src, load = ([mpf(x) for x in case[name]] for name in ("lambdas", "source", "load"))

    def without(*left_out):
        return from_roots([-x for i, x in enumerate(lam) if i not in left_out])

    def combination(head, weights):
        total = [head * c for c in without()]
        for k, weight in enumerate(weights):
            total = plus(total, [-weight * c for c in without(k)])
        return total

    x11 = combination(mpc(0, -1), [s * s for s in src])
    x12 = combination(b, [s * t for s, t in zip(src, load)])
    x22 = combination(mpc(0, -1), [t * t for t in load])
    det = [-(1 + b * b) * c for c in without()]
    for k in range(n):
        weight = mpc(0, 1) * (src[k] ** 2 + load[k] ** 2) + 2 * b * src[k] * load[k]
        det = plus(det, [weight * c for c in without(k)])
        for i in range(k):
            pair = (src[i] * load[k] - src[k] * load[i]) ** 2
            det = plus(det, [pair * c for c in without(i, k)])
    reflected = [-(c + mpc(0, 2) * x) for c, x in zip(det, x22)]
    # A resonance that one port does not see is a transmission zero: split off before roots are looked for, it may be double.
    seen = [k for k in range(n) if b != 0 or src[k] * load[k] != 0]
    dark = [-lam[k] for k in range(n) if k not in seen]
    if dark:
        x12 = [mpc(0)]
        for k in seen:
            x12 = plus(x12, [-src[k] * load[k] * c for c in from_roots([-lam[i] for i in seen if i != k])])
    transmitted = trimmed([mpc(0, 2) * mpc(c).real for c in x12])
    case_label = "network %d" % case["id"]
    poles = roots_of(det, circle(n), case_label + " E")
    reflection = roots_of(reflected, circle(n), case_label + " F")
    degree = len(transmitted) - 1
    found = roots_of([c / transmitted[-1] for c in transmitted], circle(degree, 0.8), case_label + " P")
    degree += len(dark)
    zeros = [mpc(0, w) for w in dark]
    for w in found:
        if abs(w.imag) < mpf(10) ** (20 - mp.dps // 2):
            zeros.append(mpc(0, w.real))
        elif w.imag > 0:
            zeros += [mpc(-w.imag, w.real), mpc(w.imag, w.real)]
    require(len(zeros) == degree, "transmission zeros are not mirrored")
    # P/(epsilon E) in s from the ratio of leading coefficients in w: s - r = j (w - r/j).
    ratio = transmitted[-1] / det[-1] * mpc(0, 1) ** (n - degree)
    epsilon = 1 / abs(ratio)
    lead = ratio * epsilon
    unit = min(UNITS, key=lambda u: abs(u - lead))
    require(abs(lead - unit) < mpf(10) ** -60, "leading coefficient of P is no unit")
    level = reflected[-1] / det[-1]
    require(abs(level.imag) < mpf(10) ** -60 and level.real > 0, "leading coefficient of F")
    ordered = sorted((s_plane(w) for w in poles), key=lambda s: s.imag)
    response = Response(ordered, sorted((s_plane(w) for w in reflection), key=lambda s: s.imag), zeros, unit, epsilon,
                        1 / level.real)
    for w in (mpf("0.37"), mpf(-2)):
        y = [sum(p * q / (w + x) for p, q, x in zip(u, v, lam)) for u, v in ((src, src), (src, load), (load, load))]
        x = [mpc(0, -1) - y[0], b - y[1], mpc(0, -1) - y[2]]
        d = x[0] * x[2] - x[1] ** 2
        solved = (-1 - mpc(0, 2) * x[2] / d, mpc(0, 2) * x[1] / d, -1 - mpc(0, 2) * x[0] / d)
        off = max(abs(g - h) for g, h in zip(solved, response.at(w)))
        require(off < mpf(10) ** -60, "network and product form differ by " + mp.nstr(off, 3))
    return response


# ---------------------------------------------------------------- one case

def frequencies(case, response):
    """Points on the resonances, the narrowest one always among them, and at random over three times the band."""
    unit, dice = case["scale"], iter(case["dice"])
    narrow = max(response.poles, key=lambda p: p.real)
    out = [float(narrow.imag), float(narrow.imag) - float(narrow.real)]
    for k in range(POINTS):
        if k % 3 < 2:
            pole = response.poles[int(next(dice) * case["order"])]
            out.append(float(pole.imag) + float(pole.real) * (4 * next(dice) - 2))
        else:
            out.append((6 * next(dice) - 3) * unit)
            next(dice)
    return sorted(out)


def compute(case):
    with mp.workdps(digits_for(case["order"])):
        response = from_factors(case) if case["kind"] == "factored" else from_network(case)
        points = frequencies(case, response)
        coarse = response.rounded()
        floor, defect, answers = mpf(0), mpf(0), []
        for w in points:
            s = response.at(mpf(w))
            answers.append(s)
            floor = max([floor] + [abs(x - y) for x, y in zip(s, coarse.at(mpf(w)))])
            defect = max(defect, abs(abs(s[0]) ** 2 + abs(s[1]) ** 2 - 1),
                         abs(s[0] * s[1].conjugate() + s[1] * s[2].conjugate()))
        require(defect < mpf(10) ** -60, "case %d is not lossless: %s" % (case["id"], mp.nstr(defect, 3)))
        require(all(p.real < 0 for p in response.poles), "a pole is not on the left")
        return line_of(case, response, points, answers, floor)


def line_of(case, response, points, answers, floor):
    def pairs(values):
        def column(part):
            return "[" + ",".join(text(part(v), abs(v)) for v in values) + "]"
        return '{"re":%s,"im":%s}' % (column(lambda v: v.real), column(lambda v: v.imag))

    parts = [
        '"id":%d' % case["id"],
        '"style":' + json.dumps(case["style"]),
        '"order":%d' % case["order"],
        '"digits":%d' % mp.dps,
        '"floor":' + mp.nstr(floor, 3),
        '"poles":' + pairs(response.poles),
        '"reflectionZeros":' + pairs(response.reflection),
        '"transmissionZeros":' + pairs(response.zeros),
        '"lead":{"re":%d,"im":%d}' % (int(response.lead.real), int(response.lead.imag)),
        '"epsilon":' + text(response.epsilon, abs(response.epsilon)),
        '"epsilonR":' + text(response.epsilon_r),
        '"omega":' + json.dumps(points, separators=(",", ":")),
        '"s11":' + pairs([s[0] for s in answers]),
        '"s21":' + pairs([s[1] for s in answers]),
        '"s22":' + pairs([s[2] for s in answers]),
    ]
    return "{" + ",".join(parts) + "}"


def main(arguments):
    table = cases()
    if arguments[:1] == ["build"]:
        lines = []
        for case in table:
            lines.append(compute(case))
            print(case["id"], case["style"], case["order"], file=sys.stderr, flush=True)
        head = '{"version":1,"seed":%d,"count":%d,"remakeIds":%s,"cases":[\n' % (SEED, len(lines), json.dumps(REMAKE_IDS))
        with open(STORE, "w", encoding="ascii") as file:
            file.write(head + ",\n".join(lines) + "\n]}\n")
    elif arguments[:1] == ["remake"]:
        for name in arguments[1:]:
            print(compute(table[int(name)]))
    else:
        raise ReferenceFault("build, or remake and ids")


if __name__ == "__main__":
    main(sys.argv[1:])
