"""Distribution functions and survival functions in body and tails, with mpmath at 80 digits.

usage: python3 tails.py > partition-tails.tsv

Columns: family, theta (blank-separated), x, log P(X <= x), log P(X > x). Every theta and x is the double nearest to the
decimal shown.
"""
from mpmath import mp, betainc, cos, erfc, exp, log, loggamma, mpf, pi, quad, sqrt

mp.dps = 80


def d(text):
    return mpf(float(text))


def row(family, theta, x, cdf, survival):
    show = lambda p: "-inf" if p <= 0 else mp.nstr(log(p), 25)
    print(family, theta, x, show(cdf), show(survival), sep="\t")


def incomplete_gamma(shape, y):
    """Lower and upper regularized parts: the smaller one by its own series or continued fraction."""
    if y < shape + 1:
        term, total, n = 1 / shape, 1 / shape, 0
        while term > total * mpf(10) ** -70:
            n += 1
            term *= y / (shape + n)
            total += term
        low = exp(shape * log(y) - y - loggamma(shape)) * total
        return low, 1 - low
    tiny = mpf(10) ** -2000
    b = y + 1 - shape
    c, e = 1 / tiny, 1 / b
    h, n = e, 0
    while True:
        n += 1
        a = -n * (n - shape)
        b += 2
        e = 1 / (a * e + b)
        c = b + a / c
        h *= e * c
        if abs(e * c - 1) < mpf(10) ** -70:
            break
    high = exp(shape * log(y) - y - loggamma(shape)) * h
    return 1 - high, high


for theta in ["-1", "-0.001", "-40"]:
    for x in ["1e-300", "1e-9", "0.3", "2", "30", "700", "5000"]:
        y = d(theta) * d(x)
        row("exponential", theta, x, -mp.expm1(y), exp(y))

for a, b in [("0.5", "-1.5"), ("-0.9", "-1"), ("49", "-7"), ("100000.0", "-3")]:
    for x in ["1e-30", "0.001", "0.5", "2", "7", "20", "100", "33000", "33334", "34000", "50000"]:
        shape, y = d(a) + 1, -d(b) * d(x)
        if y > 3000 and shape < 1000 and y > 1e5:
            continue
        row("gamma", f"{a} {b}", x, *incomplete_gamma(shape, y))

for a, b in [("0", "-0.5"), ("100", "-0.5"), ("2000", "-10"), ("100000000", "-0.5")]:
    for z in [-38, -20, -8, -1.5, 0, 0.25, 3, 12, 38]:
        mean, sd = -d(a) / (2 * d(b)), 1 / sqrt(-2 * d(b))
        x = repr(float(mean + z * sd))
        t = (d(x) - mean) / sd / sqrt(mpf(2))
        row("normal", f"{a} {b}", x, erfc(-t) / 2, erfc(t) / 2)

for theta in ["-1.1", "-0.001", "-1e-12"]:
    for x in ["0", "1", "10", "400", "100000"]:
        k = d(x) + 1
        row("geometric", theta, x, -mp.expm1(d(theta) * k), exp(d(theta) * k))

for theta in ["-4", "0.7", "4", "9"]:
    rate = exp(d(theta))
    for x in ["0", "1", "3", "20", "54", "60", "200", "7000", "8100", "9500"]:
        k = int(x) + 1
        if k > 60 * rate + 60:
            continue
        above, below = incomplete_gamma(mpf(k), rate)
        row("poisson", theta, x, below, above)

for a, b in [("-0.5", "-0.5"), ("50", "20"), ("0.25", "-0.75")]:
    for x in ["1e-09", "0.01", "0.25", "0.5", "0.8", "0.999"]:
        p, q, y = d(a) + 1, d(b) + 1, d(x)
        row("beta", f"{a} {b}", x, betainc(p, q, 0, y, regularized=True), betainc(q, p, 0, 1 - y, regularized=True))

mp.dps = 40


def integrate(family, theta, xs, f, points, scale):
    """Integrates exp(f) between the given points, all on one scale so that tails keep their digits."""
    for x in xs:
        y = d(x)
        near = [mpf(2) ** -k / 4 for k in range(12)]
        cut = sorted([p for p in points if p < y] + [y - h * y / 8 for h in near if y > 0] + [y - h for h in near if y - h > points[0]] + [y])
        rest = sorted([y] + [y + h for h in near if y + h < points[-1]] + [p for p in points if p > y])
        low, high = quad(lambda t: exp(f(t) - scale), cut), quad(lambda t: exp(f(t) - scale), rest)
        row(family, theta, x, low / (low + high), high / (low + high))


t = [d(v) for v in ("10", "-2", "-5")]
integrate("duration_log_lin_inv", "10 -2 -5", ["0.02", "0.2", "1", "5.5", "10", "30", "100"],
          lambda x: t[0] * log(x) + t[1] * x + t[2] / x if x > 0 else mpf("-1e9"),
          [mpf(v) for v in ("0.005 0.01 0.02 0.03 0.05 0.1 0.2 0.5 1 2 3 4 5 6 7 8 10 12 15 20 25 30 35 40 60 80 100 102 105 110 150".split())], mpf(0))
w = [d(v) for v in ("10", "-20")]
integrate("von_mises", "10 -20", ["0.001", "1", "2", "3", "5.1", "6.2"],
          lambda x: w[0] * cos(x) + w[1] * mp.sin(x), [2 * pi * k / 40 for k in range(41)], mpf(0))
q = [d(v) for v in ("0", "4", "0", "-1")]
integrate("quartic", "0 4 0 -1", ["-5", "-3", "-1.4", "0", "0.3", "1.5", "2.5", "4", "5.5"],
          lambda x: q[0] * x + q[1] * x ** 2 + q[2] * x ** 3 + q[3] * x ** 4,
          [mpf(k) / 4 for k in range(-32, 33)], mpf(0))
