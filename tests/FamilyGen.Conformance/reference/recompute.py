"""python3 recompute.py [family ...]: recomputes values/*.json from their own T, log_h and support fields with mpmath and
prints the largest relative difference of A, gradient and Hessian at each parameter point. Points at which this plain route
does not settle (a direct sum of more than a million terms, very slow ends, very narrow peaks) are named and left out."""
import json, os, re, sys
import mpmath as m

m.mp.dps = 40
HERE = os.path.join(os.path.dirname(os.path.abspath(__file__)), "values")
NAMES = dict(log=m.log, lgamma=m.loggamma, cos=m.cos, sin=m.sin, binomial=m.binomial, pi=m.pi, inf=m.inf, m=m)


def function(text):
    indicator = re.fullmatch(r"\[x==(\d+)\]", text)
    if indicator:
        return lambda x: m.mpf(x == int(indicator.group(1)))
    text = re.sub(r"(?<![\w.])(\d+(\.\d+)?)", r"m.mpf('\1')", text.replace("^", "**"))
    code = compile(text, text, "eval")
    return lambda x: eval(code, NAMES, {"x": x}) * m.mpf(1)


def lattice(doc, f):
    low, high = doc["support"]["lower"], doc["support"]["upper"]
    best, x = -m.inf, low
    while high is None or x <= high:
        value = f(m.mpf(x))
        best = max(best, value)
        if high is None and value < best - 120 and x > low + 10:
            return
        if x - low > 10**6:
            raise OverflowError
        yield m.mpf(x), m.mpf(0)
        x += 1


def nodes(doc, step):
    """x and log |dx/dt| at the nodes of the trapezoid rule in a double-exponential coordinate."""
    low, high = (m.mpf(eval(doc["support"][k], NAMES)) for k in ("lower", "upper"))
    circle = doc["family"] == "von_mises"
    if circle:
        n = int(4000 / step * m.mpf("0.03125"))
        return [(low + (high - low) * k / n, m.log((high - low) / n)) for k in range(n)]
    out, reach = [], 12 if high == m.inf and low == 0 else 6
    for k in range(int(-reach / step), int(reach / step) + 1):
        t = k * step
        u, du = m.pi / 2 * m.sinh(t), m.log(m.pi / 2 * m.cosh(t) * step)
        if low == -m.inf:
            out.append((m.sinh(u), m.log(m.cosh(u)) + du))
        elif high == m.inf:
            out.append((m.exp(u) + low, u + du))
        else:
            out.append((low + (high - low) / (1 + m.exp(-u)), m.log(high - low) - m.log(m.exp(u / 2) + m.exp(-u / 2)) * 2 + du))
    return out


def moments(points, statistics, f):
    logs = [f(x) + j for x, j in points]
    top = max(logs)
    weights = [m.exp(v - top) for v in logs]
    total = m.fsum(weights)
    table = [[t(x) if w > 0 else 0 for t in statistics] for (x, _), w in zip(points, weights)]
    k = range(len(statistics))
    mean = [m.fsum(w * r[i] for w, r in zip(weights, table)) / total for i in k]
    covariance = [[m.fsum(w * (r[i] - mean[i]) * (r[j] - mean[j]) for w, r in zip(weights, table)) / total for j in k] for i in k]
    return top + m.log(total), mean, covariance


def compare(doc, point):
    statistics, log_h = [function(t) for t in doc["T"]], function(doc["log_h"])
    theta = [m.mpf(float(v)) for v in point["theta"]]
    f = lambda x: m.fsum(t * s(x) for t, s in zip(theta, statistics)) + log_h(x)
    if doc["support"]["space"] == "integer":
        found = moments(list(lattice(doc, f)), statistics, f)
    else:
        step, found = m.mpf("0.03125"), None
        while True:
            inside = [(x, j) for x, j in nodes(doc, step) if not (doc["support"]["upper"] == "1" and x in (0, 1)) and x != 0 or doc["support"]["lower"] == "-inf"]
            last, found = found, moments(inside, statistics, f)
            if last and abs(found[0] - last[0]) < m.mpf(10) ** -24 * (1 + abs(found[0])):
                break
            step /= 2
            if step < m.mpf("1e-4"):
                raise OverflowError
    k = range(len(theta))
    sigma = [m.sqrt(m.mpf(point["hess"][i][i])) for i in k]
    return max([abs(found[0] - m.mpf(point["A"])) / (1 + abs(found[0]))]
               + [abs(found[1][i] - m.mpf(point["grad"][i])) / (sigma[i] + abs(found[1][i])) for i in k]
               + [abs(found[2][i][j] - m.mpf(point["hess"][i][j])) / (sigma[i] * sigma[j]) for i in k for j in k])


for name in sys.argv[1:] or sorted(n[:-5] for n in os.listdir(HERE)):
    doc = json.load(open(os.path.join(HERE, name + ".json")))
    for point in doc["points"]:
        try:
            print(name, point["theta"], m.nstr(compare(doc, point), 3), flush=True)
        except OverflowError:
            print(name, point["theta"], "left out", flush=True)
