"""Many-digit reference responses of generalized Chebyshev low-pass prototypes.

Route (deliberately the expanded-polynomial one, which needs many digits and here has them):
  1. numerator of S11 by the recursion of R. J. Cameron, "General coupling matrix synthesis methods for
     Chebyshev filtering functions", IEEE Trans. Microwave Theory Tech., vol. 47, no. 4, 1999 (from memory):
       U_n = (w - 1/w_n) U_(n-1) + k_n (w^2 - 1) V_(n-1),   k_n = sqrt(1 - 1/w_n^2)
       V_n = (w - 1/w_n) V_(n-1) + k_n U_(n-1),             1/w_n = 0 for a zero at infinity
     with power-basis coefficients; F is U_N made monic;
  2. poles: with f, p the real polynomials of F and P on the frequency axis, all roots of
     f/epsilonR + j p/epsilon, each moved to the half plane of stable networks (the published
     alternating-singularity method; same source);
  3. S11 = F/(epsilonR E), S21 = P/(epsilon E).
Roots come from an Ehrlich-Aberth iteration (O. Aberth, "Iteration methods for finding all zeros of a
polynomial simultaneously", Math. Comp., vol. 27, 1973, from memory) finished by Newton steps at full precision.

    make_reference.py specs                     the seeded inputs, one a line
    make_reference.py build [--ids ...]         everything -> fixtures/reference/reference.json
    make_reference.py remake --ids 3,17,...     the stored inputs computed again -> standard output
    make_reference.py floor [--ids ...]         change of S when the roots are rounded to doubles
    make_reference.py check [--ids ...]         other routes to the same numbers
"""

import argparse
import json
import math
import os
import sys
import time
from fractions import Fraction

from mpmath import mp, mpc, mpf
import mpmath

import evaluate_matrix
from make_specs import COUNT, SEED, inputs_digest, make_specs

HERE = os.path.dirname(os.path.abspath(__file__))
STORE = os.path.normpath(os.path.join(HERE, "..", "..", "fixtures", "reference", "reference.json"))
VERSION = 2
SIGNIFICANT = 20
UNITS = [mpc(1, 0), mpc(0, 1), mpc(-1, 0), mpc(0, -1)]


class ReferenceFault(Exception):
    """A verification that did not hold."""


def precision_for(order):
    return max(110, 60 + 4 * order)


# ---------------------------------------------------------------- polynomials, ascending coefficients

def times_linear(coefficients, root):
    """(w - root) * polynomial."""
    out = [mpf(0)] + list(coefficients)
    for i, c in enumerate(coefficients):
        out[i] = out[i] - root * c
    return out


def plus(a, b):
    if len(a) < len(b):
        a, b = b, a
    out = list(a)
    for i, c in enumerate(b):
        out[i] = out[i] + c
    return out


def horner(coefficients, x):
    value = coefficients[-1]
    for c in reversed(coefficients[:-1]):
        value = value * x + c
    return value


def horner_with_slope(coefficients, x):
    value, slope = coefficients[-1], mpf(0)
    for c in reversed(coefficients[:-1]):
        slope = slope * x + value
        value = value * x + c
    return value, slope


def recursion(order, zeros):
    """Monic real numerator of S11 in w = omega, and the largest imaginary share that was dropped."""
    u, v = [mpf(1)], [mpf(0)]
    for n in range(order):
        inverse = 1 / zeros[n] if n < len(zeros) else mpf(0)
        if isinstance(inverse, mpc) and inverse.imag == 0:
            inverse = inverse.real
        k = mp.sqrt(1 - inverse * inverse)
        kv = [k * c for c in v]
        new_u = plus(times_linear(u, inverse), plus([mpf(0), mpf(0)] + kv, [-c for c in kv]))
        new_v = plus(times_linear(v, inverse), [k * c for c in u])
        u, v = new_u, new_v
    u = u[:order + 1]
    lead = u[order]
    scaled = [mpc(c / lead) for c in u]
    size = max(abs(c) for c in scaled)
    dropped = max(abs(c.imag) for c in scaled) / size
    return [c.real for c in scaled], dropped


# ---------------------------------------------------------------- roots

def aberth(coefficients, starts, digits):
    """All roots to about half a double, with Newton quotients in many digits and repulsion in doubles."""
    n = len(coefficients) - 1
    with mp.workdps(digits):
        low = [+c for c in coefficients]
        z = [mpc(s) for s in starts]
        shadow = [complex(s) for s in starts]
        done = [False] * n
        for _ in range(400):
            if all(done):
                return z
            for i in range(n):
                if done[i]:
                    continue
                value, slope = horner_with_slope(low, z[i])
                if value == 0:
                    done[i] = True
                    continue
                if slope == 0:
                    z[i] += mpf(10) ** -6
                    shadow[i] = complex(z[i])
                    continue
                quotient = value / slope
                push = 0j
                here = shadow[i]
                nearest = 1.0
                for k in range(n):
                    if k != i:
                        gap = here - shadow[k]
                        if gap == 0:
                            gap = 1e-12 * (1 + abs(here))
                        push += 1 / gap
                        nearest = min(nearest, abs(gap))
                step = quotient / (1 - quotient * mpc(push))
                z[i] -= step
                shadow[i] = complex(z[i])
                if abs(step) < 1e-9 * nearest:
                    done[i] = True
    raise ReferenceFault("root iteration did not settle")


def polish(coefficients, roots, label):
    """Newton at full precision; returns the roots, the worst scaled residual and disk against separation."""
    n = len(roots)
    enough, finest = mpf(10) ** -80, mpf(10) ** -mp.dps
    out, residual, radii = [], mpf(0), []
    for z in roots:
        last = mpf("inf")
        for _ in range(40):
            value, slope = horner_with_slope(coefficients, z)
            step = value / slope
            z = z - step
            size = abs(step)
            # quadratic convergence ends where the rounding of this precision begins
            if size < finest or (size < enough and 2 * size > last):
                break
            last = size
        else:
            raise ReferenceFault(label + ": Newton did not reach 80 digits")
        value, slope = horner_with_slope(coefficients, z)
        size = horner([abs(c) for c in coefficients], abs(z))
        if value != 0:
            residual = max(residual, abs(value) / size)
        radii.append(n * abs(value / slope))
        out.append(z)
    # each disk |x - z| <= n |p/p'| holds a root: disjoint disks mean that no root is missing or doubled
    separation = mpf("inf")
    for i in range(n):
        for k in range(i):
            gap = abs(out[i] - out[k])
            separation = min(separation, gap)
            if gap <= radii[i] + radii[k]:
                raise ReferenceFault(label + ": two roots are not told apart")
    lead = coefficients[n]
    total = abs(sum(out) + coefficients[n - 1] / lead) if n > 0 else mpf(0)
    product = mpf(1)
    for z in out:
        product = product * -z
    tail = abs(product - coefficients[0] / lead) / (1 + abs(coefficients[0] / lead))
    return out, {"residual": residual, "sum": total, "product": tail, "separation": separation}


# ---------------------------------------------------------------- one specification

def exact_zero(z):
    """Zero on the w axis or off it: s = re + j im gives w = -j s = im - j re."""
    if isinstance(z, dict):
        re, im = mpf(z["re"]), mpf(z["im"])
        return im if re == 0 else mpc(im, -re)
    return mpf(z)


def leading_constant(order, zeros):
    """Exponent q of c = j^q."""
    axis = [w for w in zeros if not isinstance(w, mpc)]
    above = sum(1 for w in axis if w > 0)
    below = sum(1 for w in axis if w < 0)
    pairs = (len(zeros) - len(axis)) // 2
    return (-(order + 1) + above - below + 2 * pairs) % 4


def require(condition, message):
    if not condition:
        raise ReferenceFault(message)


class Network:
    """The prototype of one specification at the current precision."""

    def __init__(self, spec):
        order = self.order = spec["order"]
        self.zeros = [exact_zero(z) for z in spec["transmissionZeros"]]
        self.canonical = len(self.zeros) == order
        self.report = {}
        self.f, dropped = recursion(order, self.zeros)
        self.report["droppedImaginary"] = dropped
        p = [mpf(1)]
        for w in self.zeros:
            p = times_linear(p, w)
        self.report["droppedImaginary"] = max(dropped, max(abs(mpc(c).imag) for c in p) / max(abs(c) for c in p))
        self.p = [mpc(c).real for c in p]
        self.c_power = leading_constant(order, self.zeros)
        self.power = mp.power(10, mpf(spec["returnLossDb"]) / 10)
        self.kappa = mp.sqrt(self.power - 1)
        k = abs(self.p_at(mpf(1)) / horner(self.f, mpf(1))) / self.kappa
        self.epsilon = mp.sqrt(1 + k * k) if self.canonical else k
        self.epsilon_r = self.epsilon / k if self.canonical else mpf(1)
        self.find_roots()

    def p_at(self, w):
        value = mpc(1)
        for z in self.zeros:
            value *= w - z
        return value.real

    def find_roots(self):
        n = self.order
        digits = 50 + 2 * n
        starts = [mp.cos((2 * k + 1) * mp.pi / (2 * n)) for k in range(n)]
        roots = aberth(self.f, starts, digits)
        roots, facts = polish(self.f, [mpf(z.real) for z in roots], "numerator of S11")
        require(all(abs(x) < 1 for x in roots), "a reflection zero lies outside the band")
        self.reflection = sorted(roots)
        self.report["f"] = facts
        g = [mpc(a / self.epsilon_r) for a in self.f]
        for i, b in enumerate(self.p):
            g[i] += mpc(0, b / self.epsilon)
        lift = 0.5 / n + 0.002
        starts = [complex(float(x), lift * (1 if k % 2 else -1)) for k, x in enumerate(self.reflection)]
        roots, facts = polish(g, aberth(g, starts, digits), "alternating polynomial")
        self.report["g"] = facts
        upper = sum(1 for z in roots if z.imag > 0)
        require(abs(2 * upper - n) <= 1, "the roots do not split evenly between the half planes")
        poles = [mpc(-abs(z.imag), z.real) for z in roots]
        # ascending imaginary part, the negative real axis (several poles may lie there) by real part
        self.poles = sorted(poles, key=lambda p: (mp.nint(p.imag * mpf(10) ** 40), p.real))
        require(all(p.real < 0 for p in self.poles), "a pole lies on the axis")

    def leading(self):
        return UNITS[self.c_power]

    def numerators(self, w):
        """F and P at s = j w, exact powers of j taken out of real polynomials."""
        f = UNITS[self.order % 4] * horner(self.f, w)
        p = UNITS[(self.c_power + len(self.zeros)) % 4] * self.p_at(w)
        return f, p

    def denominator(self, w, poles=None):
        value = mpc(1)
        s = mpc(0, w)
        for p in self.poles if poles is None else poles:
            value *= s - p
        return value

    def response(self, w):
        f, p = self.numerators(w)
        e = self.denominator(w)
        return f / (self.epsilon_r * e), p / (self.epsilon * e)


def verify(network, points):
    """Unitarity in magnitude and phase at the stored points and at 2 N + 1 more, which fix the identity."""
    n = network.order
    extra = [2 * mp.cos(mp.pi * i / (2 * n)) for i in range(2 * n + 1)]
    power, phase = mpf(0), mpf(0)
    for w in list(points) + extra:
        s11, s21 = network.response(w)
        power = max(power, abs(abs(s11) ** 2 + abs(s21) ** 2 - 1))
        phase = max(phase, abs(s11 * s21.conjugate() + s21 * s11.conjugate()))
    edge = mpf(0)
    for w in (mpf(1), mpf(-1)):
        s11, _ = network.response(w)
        edge = max(edge, abs(abs(s11) ** 2 * network.power - 1))
    facts = network.report
    facts["power"], facts["phase"], facts["edge"] = power, phase, edge
    limit = mpf(10) ** -50
    for name in ("power", "phase", "edge", "droppedImaginary"):
        require(facts[name] < limit, "%s: %s" % (name, mp.nstr(facts[name], 5)))
    for which in ("f", "g"):
        for name in ("residual", "sum", "product"):
            require(facts[which][name] < limit, "%s %s: %s" % (which, name, mp.nstr(facts[which][name], 5)))
    return facts


def compute(spec, digits):
    """(network, its verified facts, S11 and S21 at the points) at the given number of digits."""
    with mp.workdps(digits):
        network = Network(spec)
        points = [mpf(w) for w in spec["omega"]]
        facts = verify(network, points)
        answers = [network.response(w) for w in points]
        return network, facts, answers


def text(x, scale=1):
    """A JSON number with SIGNIFICANT digits; what is rounding noise beside the scale is written as 0."""
    if abs(x) < scale * mpf(10) ** -60:
        return "0"
    out = mp.nstr(x, SIGNIFICANT, strip_zeros=True)
    return out[:-2] if out.endswith(".0") else out


def line_of(spec, network, answers, digits):
    """One compact JSON line; numbers that carry more digits than a double go in as text."""
    def array(values):
        return "[" + ",".join(values) + "]"

    def pair(values):
        return '{"re":%s,"im":%s}' % (
            array(text(v.real, abs(v)) for v in values), array(text(v.imag, abs(v)) for v in values))

    c = network.leading()
    parts = [
        '"id":%d' % spec["id"],
        '"order":%d' % spec["order"],
        '"returnLossDb":' + json.dumps(spec["returnLossDb"]),
        '"style":' + json.dumps(spec["style"]),
        '"transmissionZeros":' + json.dumps(spec["transmissionZeros"], separators=(",", ":")),
        '"precisionDigits":%d' % digits,
        '"epsilon":' + text(network.epsilon),
        '"epsilonR":' + text(network.epsilon_r),
        '"leading":{"re":%d,"im":%d}' % (int(c.real), int(c.imag)),
        '"poles":' + pair(network.poles),
        '"reflectionZeros":' + array(text(w) for w in network.reflection),
        '"omega":' + json.dumps(spec["omega"], separators=(",", ":")),
        '"s11":' + pair([a for a, _ in answers]),
        '"s21":' + pair([b for _, b in answers]),
    ]
    return "{" + ",".join(parts) + "}"


# ---------------------------------------------------------------- commands

def load():
    with open(STORE, encoding="ascii") as file:
        return json.load(file)


def chosen(specs, ids):
    if not ids or ids == "all":
        return specs
    wanted = [int(i) for i in ids.split(",")]
    table = {spec["id"]: spec for spec in specs}
    missing = [i for i in wanted if i not in table]
    require(not missing, "no such ids: %s" % missing)
    return [table[i] for i in wanted]


REMAKE_IDS = [0, 192, 130, 132, 134, 73, 276, 269, 159, 246, 283, 127]


def document(lines, specs, extra):
    head = {
        "version": VERSION,
        "seed": SEED,
        "count": len(lines),
        "significantDigits": SIGNIFICANT,
        "inputsSha256": inputs_digest(specs),
        "remakeIds": REMAKE_IDS,
    }
    head.update(extra)
    return json.dumps(head, separators=(",", ":"))[:-1] + ',"specs":[\n' + ",\n".join(lines) + "\n]}\n"


def worst(a, b):
    """Merge two fact sheets, keeping the larger (for separations the smaller) value."""
    out = dict(a)
    for key, value in b.items():
        if isinstance(value, dict):
            out[key] = worst(a.get(key, {}), value)
        elif key not in a:
            out[key] = value
        elif key == "separation":
            out[key] = min(a[key], value)
        else:
            out[key] = max(a[key], value)
    return out


def shown(facts):
    return {k: shown(v) if isinstance(v, dict) else mp.nstr(v, 3) for k, v in facts.items()}


def say(*words):
    print(*words, file=sys.stderr, flush=True)


def build(ids, out):
    specs = chosen(make_specs(), ids)
    lines, total, disagreement = [], {}, mpf(0)
    began = time.time()
    for spec in specs:
        digits = precision_for(spec["order"])
        network, facts, answers = compute(spec, digits)
        again, _, repeated = compute(spec, digits + 60)
        apart = mpf(0)
        with mp.workdps(digits):
            for (a, b), (c, d) in zip(answers, repeated):
                apart = max(apart, abs(a - c), abs(b - d))
            for p, q in zip(network.poles, again.poles):
                apart = max(apart, abs(p - q))
            for p, q in zip(network.reflection, again.reflection):
                apart = max(apart, abs(p - q))
            apart = max(apart, abs(network.epsilon / again.epsilon - 1))
        require(apart < mpf(10) ** -50, "two precisions disagree: " + mp.nstr(apart, 5))
        disagreement = max(disagreement, apart)
        total = worst(total, facts)
        lines.append(line_of(spec, network, answers, digits))
        say("id", spec["id"], "order", spec["order"], "zeros", len(spec["transmissionZeros"]),
            "%.1f s" % (time.time() - began), "two precisions apart", mp.nstr(apart, 3))
    summary = {"verification": {"twoPrecisionsApart": mp.nstr(disagreement, 3), **shown(total)}}
    content = document(lines, specs, summary)
    if out == "-":
        sys.stdout.write(content)
    else:
        with open(out, "w", encoding="ascii") as file:
            file.write(content)
    say(json.dumps(summary))
    say("%d specifications in %.0f s, mpmath %s (%s)"
        % (len(lines), time.time() - began, mpmath.__version__, mpmath.libmp.BACKEND))


def remake(ids):
    stored = load()
    specs = chosen(stored["specs"], ids or ",".join(str(i) for i in stored["remakeIds"]))
    lines = []
    for spec in specs:
        digits = precision_for(spec["order"])
        network, _, answers = compute(spec, digits)
        lines.append(line_of(spec, network, answers, digits))
    sys.stdout.write(document(lines, specs, {}))


def rounded(z):
    return mpc(float(z.real), float(z.imag))


def half_ulp(x):
    return mpf(math.ulp(float(x))) / 2


def floor(ids):
    """Change of S when roots are rounded to doubles: what absolute root positions in doubles can hold at best.

    poles: the poles rounded to nearest; all: reflection zeros and epsilon too;
    bound: first-order worst case, every part of every pole off by half a unit in the last place.
    """
    rows = []
    print("id order zeros RL        poles:S11  poles:S21  all:S11    all:S21    bound      at omega")
    for spec in chosen(load()["specs"] if os.path.exists(STORE) else make_specs(), ids):
        with mp.workdps(precision_for(spec["order"])):
            network = Network(spec)
            poles = [rounded(p) for p in network.poles]
            slack = [half_ulp(p.real) + half_ulp(p.imag) for p in network.poles]
            reflection = [mpf(float(x)) for x in network.reflection]
            change, bound, where = [mpf(0)] * 4, mpf(0), mpf(0)
            for w in (mpf(x) for x in spec["omega"]):
                f, p = network.numerators(w)
                e, moved = network.denominator(w), network.denominator(w, poles)
                value = UNITS[network.order % 4]
                for x in reflection:
                    value *= w - x
                s11, s21 = f / (network.epsilon_r * e), p / (network.epsilon * e)
                r11, r21 = f / (network.epsilon_r * moved), p / (network.epsilon * moved)
                t11 = value / (network.epsilon_r * moved)
                t21 = p / (mpf(float(network.epsilon)) * moved)
                now = [abs(d) for d in (r11 - s11, r21 - s21, t11 - s11, t21 - s21)]
                if max(now[:2]) > max(change[:2]):
                    where = w
                change = [max(c, d) for c, d in zip(change, now)]
                reach = sum(u / abs(mpc(0, w) - q) for u, q in zip(slack, network.poles))
                bound = max(bound, reach * max(abs(s11), abs(s21)))
        row = [float(c) for c in change] + [float(bound)]
        rows.append((spec, row))
        print("%-3d %-4d %-4d %-9.5g %.2e   %.2e   %.2e   %.2e   %.2e   %.7f" % (
            spec["id"], spec["order"], len(spec["transmissionZeros"]), spec["returnLossDb"], *row, where), flush=True)
    print()
    print("orders   specs  worst(poles)  median(poles)  worst(all)  worst(bound)  above 3e-13 (poles)")
    for low in range(1, 65, 8):
        part = [row for spec, row in rows if low <= spec["order"] < low + 8]
        if part:
            figures = sorted(max(r[:2]) for r in part)
            print("%2d-%2d    %-5d  %.2e      %.2e       %.2e    %.2e      %d" % (
                low, low + 7, len(part), figures[-1], figures[len(figures) // 2],
                max(max(r[:4]) for r in part), max(r[4] for r in part), sum(x > 3e-13 for x in figures)))
    top = max(rows, key=lambda item: max(item[1][:2]))
    print("worst, poles rounded: %.2e at id %d" % (max(top[1][:2]), top[0]["id"]))
    top = max(rows, key=lambda item: max(item[1][:4]))
    print("worst, poles and reflection zeros and epsilon rounded: %.2e at id %d" % (max(top[1][:4]), top[0]["id"]))


def closed_form(zeros, order, w):
    """cosh of the sum of acosh x_n, with exp(acosh x_n) = x_n + sqrt(x_n^2 - 1) on the branch of k_n."""
    total = mpc(0)
    root = mp.sqrt(mpc(w * w - 1))
    for n in range(order):
        inverse = 1 / zeros[n] if n < len(zeros) else mpf(0)
        below = 1 - w * inverse
        total += mp.log((w - inverse + root * mp.sqrt(1 - inverse * inverse)) / below)
    return mp.cosh(total)


def closed_form_in_band(zeros, order, w):
    """cos of the sum of acos x_n: every branch principal, -1 < w < 1."""
    total = mpc(0)
    for n in range(order):
        inverse = 1 / zeros[n] if n < len(zeros) else mpf(0)
        total += mp.acos((w - inverse) / (1 - w * inverse))
    return mp.cos(total)


def ladder_gap(network, points):
    """Without finite zeros: the in-line matrix of the ladder values in closed form (G. L. Matthaei, L. Young,
    E. M. T. Jones, "Microwave Filters, Impedance-Matching Networks, and Coupling Structures", McGraw-Hill, 1964;
    from memory), all couplings positive, solved for complex S11 and S21."""
    n = network.order
    reach = mp.asinh(network.kappa)
    gamma = mp.sinh(reach / n)
    a = [mp.sin((2 * k - 1) * mp.pi / (2 * n)) for k in range(1, n + 1)]
    b = [gamma ** 2 + mp.sin(k * mp.pi / n) ** 2 for k in range(1, n + 1)]
    g = [mpf(1), 2 * a[0] / gamma]
    for k in range(1, n):
        g.append(4 * a[k - 1] * a[k] / (b[k - 1] * g[k]))
    g.append(mpf(1) if n % 2 else mp.coth(reach / 2) ** 2)
    values = [[0] * (n + 2) for _ in range(n + 2)]
    for k in range(n + 1):
        coupling = 1 / mp.sqrt(g[k] * g[k + 1])
        exact = Fraction(int(mp.nint(coupling * evaluate_matrix.ONE)), evaluate_matrix.ONE)
        values[k][k + 1] = values[k + 1][k] = exact
    gap = mpf(0)
    for w in points:
        first, _ = evaluate_matrix.solve(*evaluate_matrix.assemble(values, w))
        x, y = (mpc(*first[i]) / evaluate_matrix.ONE for i in (0, n + 1))
        s11, s21 = network.response(mpf(w))
        gap = max(gap, abs(-1 - mpc(0, 2) * x - s11), abs(mpc(0, -2) * y - s21))
    return gap


CHECK_IDS = [0, 1, 2, 5, 9, 15, 40, 73, 84, 119, 127, 134, 192, 246, 276, 283]


def check(ids):
    """Closed form, equal ripple, ladder matrix, phase at omega = 0 and regenerated inputs."""
    stored = load()
    everything = stored["specs"]
    fresh = make_specs()
    require(inputs_digest(everything) == stored["inputsSha256"], "stored inputs do not match their digest")
    if len(everything) == COUNT:
        print("inputs regenerated from the seed:",
              "equal" if inputs_digest(fresh) == stored["inputsSha256"] else
              "not equal bit for bit (a mathematical function of this platform rounds otherwise)")
    limit = mpf(10) ** -50
    for spec in chosen(everything, ids or ",".join(str(i) for i in CHECK_IDS if i < len(everything))):
        with mp.workdps(precision_for(spec["order"])):
            network = Network(spec)
            n, zeros = network.order, network.zeros
            a = b = stored_gap = mpf(0)
            for i, w in enumerate(mpf(x) for x in spec["omega"]):
                s11, s21 = network.response(w)
                for name, value in (("s11", s11), ("s21", s21)):
                    away = mpc(spec[name]["re"][i], spec[name]["im"][i])
                    stored_gap = max(stored_gap, abs(away - value))
                if any(w == z for z in zeros):
                    require(s21 == 0, "S21 does not vanish at a transmission zero")
                    continue
                c = closed_form(zeros, n, w)
                a = max(a, abs(abs(s21) ** 2 * (1 + (c / network.kappa) ** 2) - 1))
                if abs(w) < 1:
                    c = closed_form_in_band(zeros, n, w)
                    b = max(b, abs(abs(s21) ** 2 * (1 + (c / network.kappa) ** 2) - 1))
            ripple = equal_ripple(network)
            start = UNITS[-(n + 1) % 4]
            for z in zeros:
                start *= abs(z)
            _, p0 = network.numerators(mpf(0))
            phase = abs(p0 / abs(p0) - start / abs(start))
            sheet = (("closed form", a), ("in band", b), ("ripple", ripple), ("phase at 0", phase),
                     ("stored as doubles", stored_gap))
            print("id %d order %d zeros %d:" % (spec["id"], n, len(zeros)),
                  ", ".join(name + " " + mp.nstr(x, 3) for name, x in sheet), flush=True)
            require(max(a, b, ripple, phase) < limit, "the routes disagree")
            if not zeros:
                gap = ladder_gap(network, spec["omega"][::9] + [-1.0, 0.0, 1.0])
                print("    ladder in closed form as a matrix, complex S11 and S21: %s" % mp.nstr(gap, 3))
                require(gap < limit, "the ladder disagrees")
            require(stored_gap < 1e-15, "the stored numbers disagree")


def equal_ripple(network):
    """Between neighbouring reflection zeros |F/P| must reach, and at the edges have, its edge value."""
    edge = abs(horner(network.f, mpf(1)) / network.p_at(mpf(1)))
    away = abs(abs(horner(network.f, mpf(-1)) / network.p_at(mpf(-1))) / edge - 1)
    slope_f = [i * c for i, c in enumerate(network.f)][1:]
    slope_p = [i * c for i, c in enumerate(network.p)][1:] or [mpf(0)]

    def turning(w):
        return horner(slope_f, w) * horner(network.p, w) - horner(network.f, w) * horner(slope_p, w)

    for low, high in zip(network.reflection, network.reflection[1:]):
        a, b, fa = low, high, turning(low)
        # the maximum is flat, so half the digits of its place give all digits of its height
        for _ in range(int(1.8 * mp.dps)):
            middle = (a + b) / 2
            fm = turning(middle)
            if (fm > 0) == (fa > 0):
                a = middle
            else:
                b = middle
        height = abs(horner(network.f, a) / network.p_at(a))
        away = max(away, abs(height / edge - 1))
    return away


def main():
    parser = argparse.ArgumentParser(description="many-digit reference responses")
    parser.add_argument("command", choices=["specs", "build", "remake", "floor", "check"])
    parser.add_argument("--ids", default="", help="comma separated, or all")
    parser.add_argument("--out", default=STORE, help="for build: a file, or - for standard output")
    options = parser.parse_args()
    if options.command == "specs":
        for spec in make_specs():
            print(json.dumps(spec, separators=(",", ":")))
    elif options.command == "build":
        build(options.ids, options.out)
    elif options.command == "remake":
        remake(options.ids)
    elif options.command == "floor":
        floor(options.ids)
    else:
        check(options.ids)


if __name__ == "__main__":
    try:
        main()
    except ReferenceFault as fault:
        print("reference: " + str(fault), file=sys.stderr)
        sys.exit(1)
