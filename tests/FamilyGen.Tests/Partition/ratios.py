"""Reference values of log Gamma(x + shift) - log Gamma(x), its derivative and its residual about x, with mpmath at 120
digits.

usage: python3 ratios.py > log-gamma-ratios.tsv

Columns: x, shift, step, value, derivative, residual, as hexadecimal doubles (arguments) and 20 digits (results).
"""
import random

from mpmath import loggamma, mp, mpf, psi, nstr

mp.dps = 120
random.seed(20)
for _ in range(600):
    x = 10 ** random.uniform(-2, 12)
    shift = random.choice([0.5, 1.5, -0.25, 2.5, 40.0, 0.001]) * random.choice([1, 1, random.random()])
    if x + shift <= 0.001:
        continue
    step = random.choice([x * 10 ** random.uniform(-6, 3), -x * random.random() * 0.99, float(random.randint(1, 50))])
    if x + step <= 0 or x + step + shift <= 0:
        continue
    X, S, H = mpf(x), mpf(shift), mpf(step)
    f = lambda t: loggamma(t + S) - loggamma(t)
    slope = psi(0, X + S) - psi(0, X)
    print(x.hex(), shift.hex(), step.hex(), nstr(f(X), 20), nstr(slope, 20), nstr(f(X + H) - f(X) - slope * H, 20), sep="\t")
