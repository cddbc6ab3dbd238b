"""Writes entries.tsv, reference values of the catalogue's entries: entry.index, settings and coefficients, and the value as
a sum high + low of two doubles. Index 0 is A, then come the means and the lower triangle of the covariance, row by row.

    python3 entries.py [points per entry] > entries.tsv
"""
import os
import random
import sys

from mpmath import (besseli, cosh, diff, erfc, exp, expm1, inf, log, log1p, loggamma, mp, mpf, pi, psi, quad, sqrt, zeta)

sys.path.insert(0, os.path.join(os.path.dirname(os.path.abspath(__file__)), "..", "SpecialFunctions"))
from laws import bessel_k, hurwitz_zeta  # noqa: E402

rng = random.Random(11)
DIGITS = 60


def gamma(k, p, q):
    a, b = p / k, -q
    return [loggamma(a) - a * log(b) - log(abs(k)), (psi(0, a) - log(b)) / k, a / b,
            psi(1, a) / k ** 2, 1 / (b * k), a / b ** 2]


def beta(a, b):
    with mp.workdps(120):
        s = a + b
        return [loggamma(a) + loggamma(b) - loggamma(s), psi(0, a) - psi(0, s), psi(0, b) - psi(0, s),
                psi(1, a) - psi(1, s), -psi(1, s), psi(1, b) - psi(1, s)]


def bessel(k, p, q, r):
    with mp.workdps(50):
        nu, up, down = p / k, -q, -r
        root = sqrt(nu * nu + 4 * up * down)
        rise, fall = (root + nu) / 2, (root - nu) / 2
        t = log(rise / up)
        v = bessel_k(rise, fall)
        scale = [1 / k, exp(t), exp(-t)]
        values = [nu * t - rise - fall + v[0] - log(k), (t + v[1]) / k, exp(t) * (1 + v[2]), exp(-t) * (1 + v[3])]
        at = 4
        for i in range(3):
            for j in range(i + 1):
                values.append(v[at] * scale[i] * scale[j])
                at += 1
        return values


def inverse_gaussian(k, q, r):
    u, d = -q, -r
    return [log(pi / d) / 2 - 2 * sqrt(u * d) - log(abs(k)), sqrt(d / u), 1 / (2 * d) + sqrt(u / d),
            sqrt(d) / u ** mpf("1.5") / 2, -1 / (2 * sqrt(u * d)), 1 / (2 * d * d) + sqrt(u) / d ** mpf("1.5") / 2]


def gaussian(b, q):
    m, v = -b / (2 * q), -1 / (2 * q)
    return [b * m / 2 + log(2 * pi * v) / 2, m, m * m + v, v, 2 * m * v, 4 * m * m * v + 2 * v * v]


def from_raw(a, e):
    """A, means and covariance of (y, y²) from the raw moments."""
    return [a, e[1], e[2], e[2] - e[1] ** 2, e[3] - e[1] * e[2], e[4] - e[2] ** 2]


def gaussian_segment(lower, upper, b, q):
    with mp.workdps(400):
        m, s = -b / (2 * q), sqrt(-1 / (2 * q))

        def tail(y):
            return mpf(0) if y == inf else mpf(2) if y == -inf else erfc((y - m) / (s * sqrt(mpf(2))))
        if lower > m:
            mass = (tail(lower) - tail(upper)) / 2
        else:
            flip = lambda y: mpf(0) if y == -inf else mpf(2) if y == inf else erfc((m - y) / (s * sqrt(mpf(2))))
            mass = (flip(upper) - flip(lower)) / 2
        z = s * sqrt(2 * pi) * mass

        def edge(n, y):
            if abs(y) == inf:
                return mpf(0)
            return y ** n * exp(-(y - m) ** 2 / (2 * s * s))
        e = [mpf(1), m + s * s * (edge(0, lower) - edge(0, upper)) / z]
        for n in range(1, 4):
            e.append(m * e[n] + s * s * (n * e[n - 1] + (edge(n, lower) - edge(n, upper)) / z))
        return from_raw(b * m / 2 + log(z), e)


def exponential(lower, upper, c):
    with mp.workdps(200):
        if abs(lower) == inf or abs(upper) == inf:
            end = lower if c < 0 else upper
            return [c * end - log(abs(c)), end - 1 / c, 1 / c ** 2]
        if c == 0:
            w = upper - lower
            return [log(w), (lower + upper) / 2, w * w / 12]
        w, t = upper - lower, abs(c) * (upper - lower)
        u = 1 / t - 1 / expm1(t)
        return [max(c * lower, c * upper) + log(-expm1(-t) / abs(c)), lower + w * u if c < 0 else upper - w * u,
                w * w * (1 / t ** 2 - exp(t) / expm1(t) ** 2)]


def von_mises(length, c, s):
    with mp.workdps(120):
        k = sqrt(c * c + s * s)
        if k == 0:
            return [log(length), mpf(0), mpf(0), mpf(1) / 2, mpf(0), mpf(1) / 2]
        i0 = besseli(0, k)
        r = besseli(1, k) / i0
        d, x, y = 1 - r / k - r * r, c / k, s / k
        return [log(length) + log(i0), x * r, y * r, x * x * d + y * y * r / k, x * y * (d - r / k), y * y * d + x * x * r / k]


def poisson(c):
    return [exp(c)] * 3


def binomial(n, c):
    p = 1 / (1 + exp(-c))
    return [n * log1p(exp(c)), n * p, n * p / (1 + exp(c))]


def negative_binomial(r, c):
    p = exp(c)
    return [-r * log(-expm1(c)), r * p / -expm1(c), r * p / expm1(c) ** 2]


def geometric_segment(n, c):
    with mp.workdps(200):
        if c == 0:
            return [log(n + 1), n / 2, ((n + 1) ** 2 - 1) / 12]
        m = n + 1

        mean = m * exp(m * c) / expm1(m * c) - exp(c) / expm1(c)
        spread = exp(c) / expm1(c) ** 2 - m * m * exp(m * c) / expm1(m * c) ** 2
        return [log(expm1(m * c) / expm1(c)), mean, spread]


def log_series(c):
    with mp.workdps(700):
        p = exp(c)
        ell = -log1p(-p) if c < -1 else -log(-expm1(c))
        q = -expm1(c)
        return [log(ell), p / (q * ell), p * (ell - p) / (q * ell) ** 2]


def zeta_law(q, c):
    ratio, mean, variance = hurwitz_zeta(-c, q)
    return [c * log(q) + ratio, log(q) + mean, variance]


def decades(low, high):
    return 10 ** rng.uniform(low, high)


def sign():
    return rng.choice([-1.0, 1.0])


def segment():
    lower = rng.uniform(-5, 5)
    return rng.choice([(lower, lower + decades(-1, 2)), (lower, inf), (-inf, lower)])


def gaussian_point():
    lower, upper = segment()
    s = decades(-2, 1)
    m = (lower if abs(lower) < inf else upper) + s * rng.uniform(-12, 12)
    return lower, upper, m / s ** 2, -0.5 / s ** 2


def exponential_point():
    lower, upper = segment()
    c = decades(-6, 2)
    return lower, upper, (c if lower == -inf else -c if upper == inf else sign() * c)


INF = float("inf")
ENTRIES = {
    "GammaForm": (gamma, lambda: (lambda k: (k, k * decades(-4, 8), -decades(-9, 9)))(rng.choice([1.0, -1.0, 2.0, 0.5, 3.7, -2.5])),
                  [(1.0, 1e-3, -1e-6), (1.0, 1e8, -1e8), (1.0, 1e8, -3.0), (2.0, 1.0, -0.5), (1.0, 10.0, -10.0), (1.0, 1e-12, -1.0)]),
    "BetaForm": (beta, lambda: (decades(-4, 6), decades(-4, 6)), [(1.0, 1.0), (0.5, 1e-9), (1e4 + 1, 1e4 + 1), (501.0, 3.0), (1e8, 1e-3)]),
    "BesselKForm": (bessel, lambda: (rng.choice([1.0, 2.0, 0.5]), sign() * decades(-2, 3), -decades(-4, 4), -decades(-4, 4)),
                    [(1.0, -0.5, -0.5, -0.5), (1.0, 0.0, -1e-10, -1e-10), (1.0, 2.5, -1.0, -1e-12), (1.0, -2.5, -1e-12, -1.0), (1.0, 1e6, -3.0, -2e6), (1.0, 1e-300, -1.0, -1.0)]),
    "InverseGaussianForm": (inverse_gaussian, lambda: (rng.choice([1.0, -1.0, 2.0]), -decades(-9, 5), -decades(-5, 5)), [(1.0, -1e-12, -0.5)]),
    "GaussianForm": (gaussian, lambda: (sign() * decades(-3, 6), -decades(-6, 6)), [(0.0, -0.5), (1e8, -0.5), (2000.0, -10.0)]),
    "GaussianSegmentForm": (gaussian_segment, gaussian_point,
                            [(0.0, INF, 0.0, -0.5), (0.0, INF, -1e6, -1e-6), (0.0, INF, -40.0, -0.5), (-1.0, 1.0, 0.0, -2.0), (0.0, 1.0, 3.0, -40.0), (1e8, INF, 1e8, -0.5), (-INF, 0.0, 30.0, -0.5)]),
    "ExponentialForm": (exponential, exponential_point,
                        [(0.0, 1.0, 0.0), (-1.0, 1.0, 1e-9), (0.0, 1.0, 700.0), (0.0, 1.0, -1.5), (0.0, 1.0, 1.4999), (1e8, 1e8 + 1, 2.0), (0.0, INF, -1e-12), (0.0, INF, -1e9)]),
    "VonMisesForm": (von_mises, lambda: (rng.choice([6.283185307179586, 24.0]), sign() * decades(-4, 3), sign() * decades(-4, 3)),
                     [(1.0, 0.0, 0.0), (1.0, -700.0, 0.0), (1.0, 24.9, 0.0), (1.0, 0.0, 1e6), (1.0, 1e-5, 0.0)]),
    "PoissonForm": (poisson, lambda: (rng.uniform(-40, 12),), [(-40.0,), (0.0,)]),
    "BinomialForm": (binomial, lambda: (float(rng.randint(1, 1000)), rng.uniform(-40, 40)), [(1.0, -40.0), (1.0, 40.0), (12.0, 0.0)]),
    "NegativeBinomialForm": (negative_binomial, lambda: (decades(-2, 4), -decades(-12, 1.5)), [(1.0, -1e-12), (1.0, -30.0), (2.5, -1e-7), (1.0, -0.6931471805599453)]),
    "GeometricSegmentForm": (geometric_segment, lambda: (float(rng.randint(1, 2000)), sign() * decades(-6, 1)),
                             [(1.0, -40.0), (1.0, 40.0), (1.0, 0.0), (1.0, 0.3), (12.0, -30.0), (1e6, 1e-7), (1e6, 1.1e-6), (1e9, -1e-3)]),
    "LogSeriesForm": (log_series, lambda: (-decades(-12, 2),), [(-1e-12,), (-40.0,), (-700.0,), (-0.6931471805599453,), (-0.7,)]),
    "ZetaForm": (zeta_law, lambda: (rng.choice([1.0, 1.0, 2.0, 10.0, 0.5, 37.25]), -1 - decades(-6, 1.8)), [(1.0, -1.0 - 2 ** -33), (1.0, -40.0), (1.0, -2.0), (5.0, -1000.0)]),
}


def main():
    count = int(sys.argv[1]) if len(sys.argv) > 1 else 24
    print("entry\targuments\thigh\tlow")
    for name, (f, draw, fixed) in ENTRIES.items():
        for arguments in sorted(set(fixed + [draw() for _ in range(count)])):
            arguments = tuple(float(a) for a in arguments)
            values = f(*[mpf(a) for a in arguments])
            for i, value in enumerate(values):
                with mp.workdps(DIGITS):
                    high = float(value)
                    low = float(value - mpf(high))
                print("\t".join([f"{name}.{i}"] + ["Infinity" if a == INF else "-Infinity" if a == -INF else repr(a) for a in arguments] + [repr(high), repr(low)]), flush=True)


mp.dps = DIGITS
main()
