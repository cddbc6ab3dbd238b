"""Prints the polynomial coefficients that LogGamma and Digamma use on [1, 3], in powers of u = x - 2.

Chebyshev interpolation at 60 nodes in 60 digits, truncated where the terms fall below 2^-58 of the function, then
expanded in powers of u (well conditioned: the nearest pole lies at u = -2).

    python3 coefficients.py
"""
from mpmath import mp, mpf, cos, pi, loggamma, psi, findroot

mp.dps = 60


def chebyshev(f, count):
    nodes = [cos(pi * (mpf(k) + mpf(1) / 2) / count) for k in range(count)]
    values = [f(u) for u in nodes]
    result = []
    for j in range(count):
        s = sum(v * cos(pi * j * (mpf(k) + mpf(1) / 2) / count) for k, v in enumerate(values))
        result.append(2 * s / count)
    result[0] /= 2
    return result


def monomials(c):
    previous, current = [mpf(1)], [mpf(0), mpf(1)]
    total = [mpf(0)] * len(c)
    total[0] += c[0]
    for j in range(1, len(c)):
        for i, a in enumerate(current):
            total[i] += c[j] * a
        following = [mpf(0)] + [2 * a for a in current]
        for i, a in enumerate(previous):
            following[i] -= a
        previous, current = current, following
    return total


def show(name, f):
    c = chebyshev(f, 60)
    size = abs(f(mpf(1)))
    keep = max(i for i, a in enumerate(c) if abs(a) > size * mpf(2) ** -58) + 1
    print(name, keep)
    for a in monomials(c[:keep]):
        print(f"        {float(a)!r},")


root = findroot(lambda x: psi(0, x), mpf("1.4616"))
high = float(root)
print("zero of digamma:", repr(high), "+", repr(float(root - mpf(high))))

def log_gamma_quotient(u):
    x = u + 2
    return loggamma(x) / ((x - 1) * (x - 2))

show("log-gamma / ((x-1)(x-2))", log_gamma_quotient)
show("digamma / (x - zero)", lambda u: psi(0, u + 2) / (u + 2 - root))
