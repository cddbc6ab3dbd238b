"""Writes residuals.tsv: function, w, step (or the ratio of the AtEnd forms), exponent, and
f(w + step) - f(w) - f'(w) step as a sum high + low of two doubles.

    python3 residuals.py [points per function] > residuals.tsv
"""
import random
import sys

from mpmath import cos, exp, expm1, log, loggamma, mp, mpf, psi, sin

mp.dps = 400
rng = random.Random(20240608)


def positive(low, high):
    return 10 ** rng.uniform(low, high)


def step_from(w):
    """A step that keeps w + step positive: tiny, comparable, almost all of w, or far beyond."""
    kind = rng.randrange(4)
    if kind == 0:
        return rng.choice([-1, 1]) * w * positive(-12, -1)
    if kind == 1:
        return w * rng.uniform(-0.9, 3)
    if kind == 2:
        return -w * (1 - positive(-6, -1))
    return w * positive(0, 8)


def ratio():
    return rng.choice([rng.choice([-1, 1]) * positive(-10, 0), rng.uniform(-40, 40), rng.uniform(-3, 3)])


def step_any():
    return rng.choice([rng.choice([-1, 1]) * positive(-10, 0), rng.uniform(-30, 30), rng.uniform(-2, 2)])


def of(f, slope):
    return lambda w, s, p: f(w + s, p) - f(w, p) - slope(w, p) * s


def at_end(f, slope):
    return lambda w, r, p: f(w * exp(r), p) - f(w, p) - slope(w, p) * w * expm1(r)


def power(w, p):
    return w ** p


def power_slope(w, p):
    return p * w ** (p - 1)


def log_power(w, p):
    return log(w) ** p


def log_power_slope(w, p):
    return p * log(w) ** (p - 1) / w


def xlogx(w, p):
    return w * log(w)


def xlogx_slope(w, p):
    return log(w) + 1


POSITIVE = {
    "Log": of(lambda w, p: log(w), lambda w, p: 1 / w),
    "LogGamma": of(lambda w, p: loggamma(w), lambda w, p: psi(0, w)),
    "XLogX": of(xlogx, xlogx_slope),
    "Power": of(power, power_slope),
    "LogPower": of(log_power, log_power_slope),
}
AT_END = {
    "LogAtEnd": at_end(lambda w, p: log(w), lambda w, p: 1 / w),
    "PowerAtEnd": at_end(power, power_slope),
    "LogPowerAtEnd": at_end(log_power, log_power_slope),
    "XLogXAtEnd": at_end(xlogx, xlogx_slope),
}
LINE = {
    "Exp": of(lambda w, p: exp(w), lambda w, p: exp(w)),
    "Cos": of(lambda w, p: cos(w), lambda w, p: -sin(w)),
    "Sin": of(lambda w, p: sin(w), lambda w, p: cos(w)),
    "Softplus": of(lambda w, p: log(1 + exp(w)), lambda w, p: 1 / (1 + exp(-w))),
    "IntegerPower": of(power, power_slope),
}
EXPONENTS = {
    "Power": lambda: rng.choice([-3.5, -1, -0.5, 0.1, 0.5, 0.9, 1.001, 1.5, 2.5, 3, 7.25, -2, 100, -80.5]),
    "PowerAtEnd": lambda: rng.choice([-3.5, -1, -0.5, 0.1, 0.5, 0.9, 1.001, 1.5, 2, 2.5, 3, 7.25]),
    "LogPower": lambda: rng.choice([2, 3, 4]),
    "LogPowerAtEnd": lambda: rng.choice([2, 3, 4]),
    "IntegerPower": lambda: rng.choice([2, 3, 4, 5, 8, -1, -2, -3]),
}


def row(name, f, w, step):
    p = float(EXPONENTS.get(name, lambda: 0)())
    value = f(mpf(w), mpf(step), int(p) if p == int(p) else mpf(p))
    high = float(value)
    if high == 0 or not (1e-290 < abs(high) < 1e290):
        return
    print(f"{name}\t{w!r}\t{step!r}\t{p!r}\t{high!r}\t{float(value - mpf(high))!r}")


def main():
    n = int(sys.argv[1]) if len(sys.argv) > 1 else 40
    print("function\tw\tstep\texponent\thigh\tlow")
    for name, f in POSITIVE.items():
        for _ in range(n):
            w = positive(-3, 8) if name == "LogGamma" else positive(-8, 8)
            row(name, f, w, step_from(w))
    for name, f in AT_END.items():
        for _ in range(n):
            row(name, f, positive(-8, 8), ratio())
    for name, f in LINE.items():
        for _ in range(n):
            w = rng.uniform(-20, 20)
            row(name, f, w, step_any())


main()
