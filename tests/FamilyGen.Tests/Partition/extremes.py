"""Log-normalizer, gradient and Hessian of families with a closed form at drawn parameters, near faces and at extreme scales
too, with mpmath at 60 digits and more.

usage: python3 extremes.py > partition-extremes.tsv

Columns as in partition-values.tsv. Parameters are doubles, written so that they round-trip.
"""
import random

from mpmath import besseli, besselk, cos, diff, exp, log, log1p, loggamma, mp, mpf, nstr, pi, psi, sqrt, zeta

mp.dps = 60
random.seed(11)


def show(family, theta, normalizer, gradient, hessian):
    name = " ".join(repr(t) for t in theta)
    rows = [("A", normalizer)]
    rows += [(f"gradient {i}", value) for i, value in enumerate(gradient)]
    rows += [(f"hessian {i} {j}", value) for i, row in enumerate(hessian) for j, value in enumerate(row)]
    for quantity, value in rows:
        print(family, name, quantity, nstr(value, 20), sep="\t")


def by_differences(family, theta, f, digits=200):
    """Derivatives of a closed form by central differences with many more digits than are asked for."""
    with mp.workdps(digits):
        point = [mpf(t) for t in theta]
        step = [mpf(10) ** -(digits // 4) * max(abs(t), mpf(10) ** -3) for t in point]

        def at(*moves):
            return f([t + step[j] * (moves.count(j) - moves.count(-1 - j)) for j, t in enumerate(point)])

        k = len(theta)
        gradient = [(at(j) - at(-1 - j)) / (2 * step[j]) for j in range(k)]
        hessian = [[(at(i, j) - at(i, -1 - j) - at(-1 - i, j) + at(-1 - i, -1 - j)) / (4 * step[i] * step[j])
                    for j in range(k)] for i in range(k)]
        show(family, theta, f(point), gradient, hessian)


def signed(low, high):
    return 10 ** random.uniform(low, high)


for _ in range(25):
    shape, rate = signed(-5, 9), signed(-200, 200) if random.random() < 0.3 else signed(-6, 6)
    theta = [shape - 1, -rate]
    a, b = mpf(theta[0]) + 1, mpf(rate)
    show("gamma", theta, loggamma(a) - a * log(b), [psi(0, a) - log(b), a / b], [[psi(1, a), 1 / b], [1 / b, a / b ** 2]])

for _ in range(25):
    a, b = signed(-4, 6), signed(-4, 6)
    theta = [a - 1, b - 1]
    a, b = mpf(theta[0]) + 1, mpf(theta[1]) + 1
    c = a + b
    show("beta", theta, loggamma(a) + loggamma(b) - loggamma(c), [psi(0, a) - psi(0, c), psi(0, b) - psi(0, c)],
         [[psi(1, a) - psi(1, c), -psi(1, c)], [-psi(1, c), psi(1, b) - psi(1, c)]])

for _ in range(25):
    mean, sd = random.choice([-1, 1]) * signed(-8, 9), signed(-4, 6)
    theta = [mean / sd ** 2, -0.5 / sd ** 2]
    m, v = -mpf(theta[0]) / (2 * mpf(theta[1])), -1 / (2 * mpf(theta[1]))
    show("normal", theta, m * m / (2 * v) + log(2 * pi * v) / 2, [m, m * m + v], [[v, 2 * m * v], [2 * m * v, 4 * m * m * v + 2 * v * v]])

for _ in range(30):
    theta = [random.choice([-1, 1]) * signed(-1, 3), -signed(-8, 4), -signed(-8, 4)]
    by_differences("duration_log_lin_inv", theta,
                   lambda t: log(2) + (t[0] + 1) / 2 * log(t[2] / t[1]) + log(besselk(t[0] + 1, 2 * sqrt(t[1] * t[2]))))

for _ in range(15):
    theta = [random.choice([-1, 1]) * signed(-6, 5), random.choice([-1, 1]) * signed(-6, 5)]
    by_differences("von_mises", theta, lambda t: log(2 * pi * besseli(0, sqrt(t[0] ** 2 + t[1] ** 2))))

for _ in range(15):
    theta = [signed(-3, 1.4) * random.choice([-1, 1])]
    t = exp(mpf(theta[0]))
    show("poisson", theta, t, [t], [[t]])

for _ in range(20):
    theta = [-signed(-13, 1.5)]
    t = mpf(theta[0])
    p = exp(t)
    mean = mpf(2.5) * p / (1 - p)
    show("negative_binomial_r2p5", theta, -mpf(2.5) * log1p(-p), [mean], [[mean / (1 - p)]])
    mean = p / (1 - p)
    show("geometric", theta, -log1p(-p), [mean], [[mean / (1 - p)]])
