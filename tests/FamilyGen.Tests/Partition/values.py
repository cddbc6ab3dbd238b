"""Flattens the reference values of scalar families into partition-values.tsv.

usage: python3 values.py FOLDER > partition-values.tsv, FOLDER holding one JSON file a family: log-normalizer, gradient, Hessian and
log-densities at parameter points, computed with mpmath at 100 digits by two independent routes and written with 25 digits.
Every theta and x is the double nearest to the decimal shown.

Columns: family, theta (blank-separated), quantity (A, gradient i, hessian i j, density x), value.
"""
import json
import pathlib
import sys

FAMILIES = """bernoulli binomial_n12 poisson geometric negative_binomial_r2p5 exponential gamma beta normal lognormal
chi_squared inverse_gaussian von_mises dispersed_count dispersed_count_from_1 dispersed_count_extra_zero
poisson_extra_zero duration_log_lin_inv duration_window_2_30 bounded_log_log_lin quartic categorical_4""".split()

folder = pathlib.Path(sys.argv[1])
for family in FAMILIES:
    for point in json.loads((folder / f"{family}.json").read_text())["points"]:
        theta = " ".join(point["theta"])
        rows = [("A", point["A"])]
        rows += [(f"gradient {i}", value) for i, value in enumerate(point["grad"])]
        rows += [(f"hessian {i} {j}", value) for i, row in enumerate(point["hess"]) for j, value in enumerate(row)]
        rows += [(f"density {entry['x']}", entry["log_density"]) for entry in point["log_density"]]
        for quantity, value in rows:
            print(family, theta, quantity, value, sep="\t")
