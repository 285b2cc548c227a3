"""Seeded specifications for the many-digit reference.

Only random.Random(seed).random() feeds the generator, every number is an IEEE double, and the
JSON text writes each double with repr, so every reader starts from exactly the same input.

    python3 test/reference/make_specs.py            prints all specifications, one a line
"""

import hashlib
import json
import math
import random

SEED = 20261203
COUNT = 300
HIGHEST_ORDER = 64
POINTS = 100


def round_or_keep(rng, value, digits, share):
    """Sometimes a short decimal, sometimes all 53 bits."""
    return round(value, digits) if rng.random() < share else value


def magnitude(rng):
    """Distance of an axis zero from the origin: 1 + log-uniform 1e-3 .. 9, now and then exactly 1.001."""
    if rng.random() < 0.07:
        return 1.001
    value = 1.0 + 1e-3 * 9000.0 ** rng.random()
    return max(1.001, round_or_keep(rng, value, 4, 0.5))


def side(rng):
    return 1.0 if rng.random() < 0.5 else -1.0


def sigma(rng):
    """Real part of an off-axis zero, log-uniform 0.05 .. 5."""
    return round_or_keep(rng, 0.05 * 100.0 ** rng.random(), 4, 0.5)


def height(rng):
    """Imaginary part of an off-axis zero: inside, near and beyond the band."""
    value = -1.2 + 2.4 * rng.random() if rng.random() < 0.6 else -4.0 + 8.0 * rng.random()
    value = round_or_keep(rng, value, 4, 0.5)
    return value if value != 0.0 else 0.25


def single(rng):
    return [side(rng) * magnitude(rng)]


def twice(rng):
    return single(rng) * 2


def thrice(rng):
    return single(rng) * 3


def mirrored(rng):
    w = magnitude(rng)
    return [w, -w]


def pair(rng):
    a, w = sigma(rng), height(rng)
    return [{"re": a, "im": w}, {"re": -a, "im": w}]


def real_pair(rng):
    a = sigma(rng)
    return [{"re": a, "im": 0.0}, {"re": -a, "im": 0.0}]


def quad(rng):
    a, w = sigma(rng), abs(height(rng))
    return [{"re": x, "im": y} for x in (a, -a) for y in (w, -w)]


# style -> weighted groups; a group that no longer fits is passed over
STYLES = {
    "axis": [(1.0, single)],
    "symmetric": [(0.6, mirrored), (0.2, real_pair), (0.2, quad)],
    "repeated": [(0.3, single), (0.4, twice), (0.15, thrice), (0.15, mirrored)],
    "off-axis": [(0.25, single), (0.4, pair), (0.2, real_pair), (0.15, quad)],
    "mixed": [(0.35, single), (0.2, mirrored), (0.1, twice), (0.2, pair), (0.075, real_pair), (0.075, quad)],
}
STYLE_WEIGHTS = [(0.25, "axis"), (0.2, "symmetric"), (0.15, "repeated"), (0.2, "off-axis"), (0.2, "mixed")]


def weighted(rng, table):
    u = rng.random() * sum(w for w, _ in table)
    for w, item in table:
        u -= w
        if u < 0.0:
            return item
    return table[-1][1]


def zero_count(rng, order):
    """How many finite zeros: none, a few, as many as the cap, or anything up to the cap."""
    cap = order if order <= 16 else min(order - 1, 12 + int(9 * rng.random()))
    u = rng.random()
    if u < 0.08:
        return 0
    if u < 0.38:
        return min(cap, 1 + int(4 * rng.random()))
    if u < 0.58:
        return cap
    return int((cap + 1) * rng.random())


def transmission_zeros(rng, order):
    count = zero_count(rng, order)
    style = weighted(rng, STYLE_WEIGHTS)
    if style == "symmetric" and count == 1 and order >= 3:
        count = 2
    zeros = []
    while len(zeros) < count:
        left = count - len(zeros)
        if left == 1:
            if style == "symmetric":
                break
            zeros += single(rng)
            continue
        group = weighted(rng, STYLES[style])(rng)
        if len(group) <= left:
            zeros += group
    if rng.random() < 0.3:
        for i in range(len(zeros) - 1, 0, -1):
            k = int((i + 1) * rng.random())
            zeros[i], zeros[k] = zeros[k], zeros[i]
    return style, zeros


def return_loss(rng):
    u = rng.random()
    if u < 0.05:
        return 3.0
    if u < 0.10:
        return 60.0
    return round_or_keep(rng, 3.0 + 57.0 * rng.random(), 1, 0.6)


def hard_frequencies(rng, zeros):
    """The edges, up to four axis zeros and 16 points 1e-6 to 1e-1 from the edges: where poles lie close to the axis."""
    points = {-1.0, 1.0}
    for z in zeros:
        if not isinstance(z, dict) and abs(z) <= 4.0 and len(points) < 6:
            points.add(z)
    for _ in range(16):
        points.add(side(rng) * (1.0 + side(rng) * 10.0 ** (-6.0 + 5.0 * rng.random())))
    return sorted(points)


def frequencies(spec_id):
    """POINTS doubles in [-4, 4], ascending: one at random in each of POINTS equal cells. A stream of its own."""
    rng = random.Random(SEED + 7919 * (spec_id + 1))
    return [-4.0 + 8.0 * (k + rng.random()) / POINTS for k in range(POINTS)]


def make_specs(seed=SEED, count=COUNT):
    rng = random.Random(seed)
    specs = []
    for i in range(count):
        full_rounds = (count // HIGHEST_ORDER) * HIGHEST_ORDER
        order = i % HIGHEST_ORDER + 1 if i < full_rounds else 1 + int(HIGHEST_ORDER * rng.random())
        style, zeros = transmission_zeros(rng, order)
        loss = return_loss(rng)
        specs.append({
            "id": i,
            "order": order,
            "returnLossDb": loss,
            "style": style if zeros else "none",
            "transmissionZeros": zeros,
            "omega": frequencies(i) + hard_frequencies(rng, zeros),
        })
    return specs


INPUT_KEYS = ("id", "order", "returnLossDb", "transmissionZeros", "omega")


def inputs_digest(specs):
    """SHA-256 over the inputs alone, each specification as compact JSON and a line feed."""
    digest = hashlib.sha256()
    for spec in specs:
        text = json.dumps([spec[key] for key in INPUT_KEYS], separators=(",", ":"))
        digest.update((text + "\n").encode("ascii"))
    return digest.hexdigest()


if __name__ == "__main__":
    for one in make_specs():
        print(json.dumps(one, separators=(",", ":")))
