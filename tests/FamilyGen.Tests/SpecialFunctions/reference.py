"""Writes special.tsv, the reference values of the special functions: function, x, and the value as a sum high + low of
two doubles. Points are drawn with a fixed seed, dense near zeros and ends, and always contain the extremes.

    python3 reference.py [points per function and region] > special.tsv
"""
import random
import sys

from mpmath import exp, expm1, log, log1p, loggamma, mp, mpf, psi, sin

mp.dps = 60
# a difference that cancels near 0 is worked out with as many digits more as it loses
WIDE = 700

ZERO = 1.4616321449683622           # of digamma


def wide(f):
    def value(x):
        with mp.workdps(WIDE):
            return f(x)
    return value


FUNCTIONS = {
    "Log1P": log1p,
    "ExpM1": expm1,
    "ExpM1Minus": wide(lambda x: exp(x) - 1 - x),
    "Log1PMinus": wide(lambda x: log(1 + x) - x),
    "XLog1PMinus": wide(lambda x: (1 + x) * log(1 + x) - x),
    "MinusSin": wide(lambda x: x - sin(x)),
    "LogOnePlusExp": lambda x: log1p(exp(x)),
    "Logistic": lambda x: 1 / (1 + exp(-x)),
    "LogGamma": wide(loggamma),
    "Digamma": lambda x: psi(0, x),
    "Trigamma": lambda x: psi(1, x),
    "Tetragamma": lambda x: psi(2, x),
}

rng = random.Random(20240607)


def uniform(low, high, count):
    return [rng.uniform(low, high) for _ in range(count)]


def tiny(low, high, count):
    """Both signs, exponents of ten between low and high."""
    return [rng.choice([-1, 1]) * 10 ** rng.uniform(low, high) for _ in range(count)]


def near(centre, count):
    return [centre + d for d in tiny(-15, -1, count)] + [centre]


def positive(low, high, count):
    return [10 ** rng.uniform(low, high) for _ in range(count)]


def points(name, n):
    if name in ("Log1P", "Log1PMinus", "XLog1PMinus"):
        low = -150 if "Minus" in name else -300
        above_end = [-1 + d for d in positive(-15, -0.5, n)]
        return (tiny(low, -1, n) + uniform(-0.9, 3, 2 * n) + above_end + positive(0, 300, n)
                + [-1 + 2 ** -53, 10.0 ** low, 1e300, 1.0, -0.5])
    if name in ("ExpM1", "ExpM1Minus"):
        low = -300 if name == "ExpM1" else -150
        return tiny(low, -1, n) + uniform(-3, 3, 2 * n) + uniform(-700, 700, n) + [709.5, -745.0, -1e300, 0.7, -0.7, 1.0, -1.0]
    if name == "MinusSin":
        return tiny(-100, -1, n) + uniform(-4, 4, 2 * n) + tiny(0, 6, n)
    if name in ("LogOnePlusExp", "Logistic"):
        return tiny(-20, 0, n) + uniform(-40, 40, 2 * n) + uniform(-700, 700, n) + [-700.0, 700.0, 0.0]
    extremes = {
        "LogGamma": [1e-300, 1e-20, 2.0 ** -1022, 1e305, 1e17],
        "Digamma": [1e-300, 1e-20, 1e305, 1e17],
        "Trigamma": [1e-150, 1e-20, 1e300, 1e17],
        "Tetragamma": [1e-100, 1e-20, 1e150, 1e17],
    }[name]
    high = 150 if name == "Tetragamma" else 300
    zeros = {"LogGamma": near(1, n) + near(2, n), "Digamma": near(ZERO, n)}.get(name, [])
    return (positive(-100, 0, n) + uniform(0.01, 4, 2 * n) + uniform(2, 30, 2 * n) + positive(1, high, n) + zeros
            + extremes + [0.5, 1.0, 1.5, 2.0, 2.5, 3.0, 10.0, 10.0 - 2 ** -49])


def main():
    n = int(sys.argv[1]) if len(sys.argv) > 1 else 16
    print("function\tx\thigh\tlow")
    for name, f in FUNCTIONS.items():
        for x in sorted(set(points(name, n))):
            value = f(mpf(x))
            high = float(value)
            print(f"{name}\t{x!r}\t{high!r}\t{float(value - mpf(high))!r}")


main()
