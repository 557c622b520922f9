"""The margin of compensation plans, one plan at a time and vectorised over nodes: the loop one would write first.

Reads a problem as JSON on standard input (made by the benchmark), works on the plans in it, and writes the least margin of each and the
seconds a plan took.
"""
import json
import sys
import time

import numpy as np

problem = json.load(sys.stdin)
shape = np.array(problem["shape"])
degree = np.array(problem["degree"])
mean = np.array(problem["mean"])
within = np.array(problem["within"])
lots = np.array(problem["lots"])
node_x, node_tau = np.array(problem["x"]), np.array(problem["tau"])
design, added, drift, steady = (np.array(problem[k]) for k in ("design", "added", "drift", "steady"))
sample, long_run = problem["sample"], problem["long-run"]


def shapes(x):
    return np.array([np.ones_like(x), x, 4 * x * (1 - x), 6 * np.sqrt(3) * x * (1 - x) * (1 - 2 * x)])


def basis(x, tau):
    return shapes(x)[shape].T * tau[:, None] ** degree


def columns(x, tau, zero, span, bow, s):
    psi = shapes(x)
    parts = [tau[:, None] ** np.arange(zero + 1), x[:, None] * tau[:, None] ** np.arange(span + 1)]
    if bow:
        parts.append(psi[2][:, None])
    if s:
        parts.append(psi[3][:, None])
    return np.hstack(parts)


node_basis = basis(node_x, node_tau)


def margin(plan):
    x, tau, variance = (np.array(plan[k]) for k in ("x", "tau", "variance"))
    form = plan["zero"], plan["span"], problem["bow"], problem["s-shape"]
    weights = columns(node_x, node_tau, *form) @ np.linalg.pinv(columns(x, tau, *form))
    g = node_basis - weights @ basis(x, tau)
    mu = g @ mean
    sigma_w = np.einsum("ni,ij,nj->n", g, within, g) + weights**2 @ variance + steady
    sigma_t = sigma_w + np.einsum("ni,ij,nj->n", g, lots, g)
    room = design - np.maximum(np.abs(mu), np.abs(mu + drift)) - added
    return np.min(room / np.maximum(3 * sample * np.sqrt(sigma_w), 3 * long_run * np.sqrt(sigma_t)))


for plan in problem["plans"][:20]:
    margin(plan)
best = float("inf")
for _ in range(problem["repetitions"]):
    start = time.perf_counter()
    margins = [margin(plan) for plan in problem["plans"]]
    best = min(best, (time.perf_counter() - start) / len(margins))
json.dump({"margins": margins, "seconds-a-plan": best}, sys.stdout)
