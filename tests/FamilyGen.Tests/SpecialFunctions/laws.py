"""Writes laws.tsv, reference values of the special functions behind closed forms: function, arguments, and the value as a
sum high + low of two doubles. A function with several results has one row for each, "NormalTail.0" and so on.

    python3 laws.py [points per function] > laws.tsv
"""
import random
import sys

from mpmath import (besseli, besselk, erfc, exp, expm1, log, log1p, loggamma, mp, mpf, pi, psi, sqrt, zeta)

rng = random.Random(7)
DIGITS = 60


def wide(digits):
    return mp.workdps(digits)


def log_beta(a, b):
    with wide(120):
        return [loggamma(a) + loggamma(b) - loggamma(a + b)]


def digamma_difference(a, b):
    with wide(120):
        return [psi(0, a + b) - psi(0, a)]


def trigamma_difference(a, b):
    with wide(120):
        return [psi(1, a) - psi(1, a + b)]


def erfcx(x):
    with wide(80):
        if x > 1e4:
            total, term = mpf(0), mpf(1)
            for k in range(1, 40):
                total += term
                term *= -(2 * k - 1) / (2 * x * x)
            return [total / (x * sqrt(pi))]
        return [exp(x * x) * erfc(x)]


def bessel_i(k):
    with wide(120):
        i0, i1 = besseli(0, k), besseli(1, k)
        if k < 1e-20:
            return [k * k / 4 - k, k / 2, mpf(1) / 2]
        return [log(i0) - k, i1 / i0, 1 - i1 / i0 / k - (i1 / i0) ** 2]


def normal_tail(alpha):
    with wide(400 if abs(alpha) < 1e6 else 200):
        m = max(alpha, mpf(0))
        if alpha < -200:
            h = mpf(0)
            total = sqrt(2 * pi)
        else:
            total = sqrt(pi / 2) * erfc(alpha / sqrt(mpf(2))) * exp(m * m / 2)
            h = exp(m * m / 2 - alpha * alpha / 2) / total
        # moments of t about 0
        raw = [mpf(1), h, 1 + alpha * h, (alpha ** 2 + 2) * h, 3 + (alpha ** 3 + 3 * alpha) * h]
        binomial = [[1], [1, 1], [1, 2, 1], [1, 3, 3, 1], [1, 4, 6, 4, 1]]
        e = [sum(binomial[n][i] * raw[i] * (-m) ** (n - i) for i in range(n + 1)) for n in range(5)]
        return [log(total), e[1], e[2], e[2] - e[1] ** 2, e[3] - e[1] * e[2], e[4] - e[2] ** 2]


def bessel_k(p, n):
    with wide(50):
        width = p + n
        step = mpf(1) / 12 if width < 5 else mpf(1) / 4 / sqrt(width)
        sums = [mpf(0)] * 10

        def add(s):
            u = [s, expm1(s), expm1(-s)]
            w = exp(-p * (u[1] - u[0]) - n * (u[2] + u[0]))
            sums[0] += w
            at, small = 4, w < mpf(10) ** -45 * sums[0]
            for i in range(3):
                sums[1 + i] += w * u[i]
                for j in range(i + 1):
                    sums[at] += w * u[i] * u[j]
                    at += 1
                small = small and w * u[i] ** 2 < mpf(10) ** -45 * sums[at - 1]
            return small
        add(mpf(0))
        for side in (step, -step):
            k = 1
            while not add(side * k):
                k += 1
        mean = [sums[1 + i] / sums[0] for i in range(3)]
        second, at = [], 4
        for i in range(3):
            for j in range(i + 1):
                second.append(sums[at] / sums[0] - mean[i] * mean[j])
                at += 1
        value = [log(sums[0] * step)] + mean + second
    if mpf("0.1") < p < 20 and mpf("0.1") < n < 20:                # the same by K itself
        with wide(40):
            nu, omega, t = p - n, 2 * sqrt(p * n), log(p / n) / 2
            k = besselk(nu, omega)
            assert abs(log(2 * k) - nu * t + p + n - value[0]) < mpf(10) ** -25
            assert abs(exp(-t) * besselk(nu + 1, omega) / k - 1 - value[2]) < mpf(10) ** -25
    return value


def hurwitz_zeta(s, q):
    if s > 25:
        with wide(60):
            sums, n = [mpf(0)] * 3, 1
            while True:
                ell = log1p(n / q)
                w = exp(-s * ell)
                for j in range(3):
                    sums[j] += w * ell ** j
                if w * (n + q) / (s - 1) < mpf(10) ** -40 * sums[0]:
                    break
                n += 1
            mean = sums[1] / (1 + sums[0])
            return [log1p(sums[0]), mean, sums[2] / (1 + sums[0]) - mean ** 2]
    with wide(90):
        z, z1, z2 = zeta(s, q), zeta(s, q, 1), zeta(s, q, 2)
        return [log(z) + s * log(q), -z1 / z - log(q), z2 / z - (z1 / z) ** 2]


def decades(low, high):
    return 10 ** rng.uniform(low, high)


def sign():
    return rng.choice([-1, 1])


FUNCTIONS = {
    "LogBeta": (log_beta, lambda: (decades(-9, 9), decades(-9, 9)), [(1.0, 1.0), (1e4 + 1, 1e4 + 1), (501.0, 3.0), (10.0, 10.0), (1e8, 1e-8), (9.999, 1e9)]),
    "DigammaDifference": (digamma_difference, lambda: (decades(-9, 9), decades(-9, 9)), [(0.5, 1e-10), (1e8, 1e-8), (10.0, 1e-5), (9.99, 1e6), (1e8, 1e8)]),
    "TrigammaDifference": (trigamma_difference, lambda: (decades(-9, 9), decades(-9, 9)), [(0.5, 1e-10), (1e8, 1e-8), (10.0, 1e-5), (9.99, 1e6), (1e8, 1e8)]),
    "Erfcx": (erfcx, lambda: (decades(-3, 3),), [(0.0,), (1e-300,), (1e9,), (1e300,), (3.75,), (1.0,), (26.0,)]),
    "BesselI": (bessel_i, lambda: (decades(-3, 3),), [(1e-300,), (1e-8,), (24.99,), (25.01,), (1e6,), (1e15,), (1000.0,)]),
    "NormalTail": (normal_tail, lambda: (sign() * decades(-3, 2),), [(0.0,), (-1000.0,), (-38.5,), (1.999,), (2.001,), (1e5,), (1e9,), (-0.5,)]),
    "BesselK": (bessel_k, lambda: (decades(-3, 6), decades(-3, 6)), [(1e-12, 1.0), (1.0, 1e-12), (1e-9, 1e-9), (1e12, 1e12), (1e12, 1e-3), (25.0, 25.0), (1e-6, 1e6)]),
    "HurwitzZeta": (hurwitz_zeta, lambda: (1 + decades(-6, 2), decades(-2, 4)), [(1 + 2 ** -33, 1.0), (2.0, 1.0), (40.0, 1.0), (1000.0, 1.0), (1e6, 1e6), (1.5, 1e9), (24.0, 0.001), (3.0, 1e-3), (1000.0, 500.0)]),
}


def main():
    count = int(sys.argv[1]) if len(sys.argv) > 1 else 40
    print("function\targuments\thigh\tlow")
    for name, (f, draw, fixed) in FUNCTIONS.items():
        for arguments in sorted(set(fixed + [draw() for _ in range(count)])):
            values = f(*[mpf(a) for a in arguments])
            for i, value in enumerate(values):
                with wide(DIGITS):
                    high = float(value)
                    low = float(value - mpf(high))
                label = name if len(values) == 1 else f"{name}.{i}"
                print("\t".join([label] + [repr(a) for a in arguments] + [repr(high), repr(low)]), flush=True)


mp.dps = DIGITS
if __name__ == "__main__":
    main()
