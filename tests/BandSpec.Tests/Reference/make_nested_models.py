#!/usr/bin/env python3
"""Writes nested-models.csv: the most likely figures of nested models for the published data sets beside it.

The data sets are balanced, so the figures follow from sums of squares: between units, the covariance of each unit's own least-squares
coefficients less what noise adds to it; only independent lines need Newton steps. Deviances are those of the definition, with the full
covariance matrix of each group, and every figure is tried one part in a hundred thousand to either side: the deviance has to rise.

Debian bookworm, Python 3.11, mpmath 1.2.1, 40 digits; takes some seconds:  /usr/bin/python3 make_nested_models.py
"""
import csv
from mpmath import mp, mpf, matrix, log, pi, sqrt, det, inverse, findroot, diff

mp.dps = 40


def load(name):
    with open(name + ".csv") as file:
        rows = list(csv.DictReader(line for line in file if not line.startswith("#")))
    groups = {}
    for row in rows:
        groups.setdefault((row["lot"], row["unit"]), []).append((mpf(row["x"]), mpf(row["reading"])))
    return groups


def deviance(blocks, design, covariance, restricted):
    """Minus twice the logarithm of the likelihood, means profiled out; every block of readings has the same design and covariance."""
    weight, size, terms = inverse(covariance), design.rows, design.cols
    information = design.T * weight * design * len(blocks)
    total = matrix(terms, 1)
    for y in blocks:
        total += design.T * weight * y
    mean = inverse(information) * total
    value = len(blocks) * log(det(covariance))
    for y in blocks:
        rest = y - design * mean
        value += (rest.T * weight * rest)[0]
    count = len(blocks) * size - (terms if restricted else 0)
    return value + count * log(2 * pi) + (log(det(information)) if restricted else 0), mean, inverse(information)


def stationary(of, figures):
    """The deviance rises when a figure is moved by one part in a hundred thousand."""
    here = of(figures)
    for i, figure in enumerate(figures):
        for step in (mpf(1) - mpf(10) ** -5, mpf(1) + mpf(10) ** -5):
            moved = list(figures)
            moved[i] = figure * step
            assert of(moved) > here, (i, figure)


def units(name, columns):
    """Blocks, design, and the sums behind the closed forms: Gram matrix, spread of the coefficients about their mean, squares left over."""
    groups = list(load(name).values())
    design = matrix([[x ** k for k in range(columns)] for x, _ in groups[0]])
    assert all([x for x, _ in g] == [x for x, _ in groups[0]] for g in groups), "balanced"
    blocks = [matrix([y for _, y in g]) for g in groups]
    gram = design.T * design
    lines = [inverse(gram) * (design.T * y) for y in blocks]
    mean = sum(lines, matrix(columns, 1)) / len(blocks)
    about = sum(((b - mean) * (b - mean).T for b in lines), matrix(columns, columns))
    left = sum(((y - design * b).T * (y - design * b))[0] for y, b in zip(blocks, lines))
    return blocks, design, gram, about, left


def row(name, restricted, blocks, design, within, residual):
    """within: covariance of the coefficients; residual: variance."""
    covariance = design * within * design.T + residual * mp.eye(design.rows)
    value, mean, error = deviance(blocks, design, covariance, restricted)
    return name, restricted, mean, error, within, mpf(0), residual, value


def free(name, columns, restricted):
    blocks, design, gram, about, left = units(name, columns)
    count = len(blocks)
    residual = left / (count * (design.rows - columns))
    within = about / (count - 1 if restricted else count) - residual * inverse(gram)
    if within[0, 0] < 0:  # one column only: the spread belongs at zero, and everything is one sample
        readings = [y[i] for y in blocks for i in range(y.rows)]
        centre = sum(readings) / len(readings)
        residual = sum((y - centre) ** 2 for y in readings) / (len(readings) - (1 if restricted else 0))
        within = matrix(1, 1)
        stationary(lambda f: deviance(blocks, design, f[0] * mp.eye(design.rows), restricted)[0], [residual])
    elif columns == 1:
        stationary(lambda f: deviance(blocks, design, f[0] * design * design.T + f[1] * mp.eye(design.rows), restricted)[0], [within[0, 0], residual])
    else:
        def of(f):
            return deviance(blocks, design, design * matrix([[f[0], f[1]], [f[1], f[2]]]) * design.T + f[3] * mp.eye(design.rows), restricted)[0]
        stationary(of, [within[0, 0], within[0, 1], within[1, 1], residual])
    return row(name, restricted, blocks, design, within, residual)


def independent(name):
    """Two spreads without correlation: the coefficients of a unit scatter with diag(a, b) + s·Gram⁻¹; Newton on the slopes."""
    blocks, design, gram, about, left = units(name, 2)
    count, inner = len(blocks), inverse(gram)

    def of(a, b, s):
        spread = matrix([[a, 0], [0, b]]) + s * inner
        weight = inverse(spread)
        trace = sum((weight * about)[i, i] for i in range(2))
        return (count - 1) * log(det(spread)) + trace + count * (design.rows - 2) * log(s) + left / s

    start = (mpf(630), mpf(36), mpf(650))
    found = findroot(lambda *f: [diff(of, f, n) for n in ((1, 0, 0), (0, 1, 0), (0, 0, 1))], start, tol=mpf(10) ** -40)
    a, b, s = found
    stationary(lambda f: of(*f), [a, b, s])
    return row(name + "-independent", True, blocks, design, matrix([[a, 0], [0, b]]), s)


def level_only(name):
    """A spread in the level and one slope for all: analysis of variance, the slope being the same in every unit's design."""
    blocks, design, *_ = units(name, 2)
    n, count = design.rows, len(blocks)
    x = [design[i, 1] - sum(design[:, 1]) / n for i in range(n)]
    means = [sum(y) / n for y in blocks]
    centre = sum(means) / count
    slope = sum(x[i] * y[i] for y in blocks for i in range(n)) / (count * sum(v * v for v in x))
    left = sum((y[i] - m - slope * x[i]) ** 2 for y, m in zip(blocks, means) for i in range(n))
    residual = left / (count * (n - 1) - 1)
    level = sum((m - centre) ** 2 for m in means) / (count - 1) - residual / n
    ones = matrix([[1] * n] * n)
    stationary(lambda f: deviance(blocks, design, f[0] * ones + f[1] * mp.eye(n), True)[0], [level, residual])
    return row(name + "-level", True, blocks, design, matrix([[level, 0], [0, 0]]), residual)


def nested(name):
    """Casks in batches: mean squares of batches, of casks in batches and of readings in casks."""
    batches = {}
    for (lot, unit), readings in load(name).items():
        batches.setdefault(lot, {})[unit] = [y for _, y in readings]
    lots = [list(b.values()) for b in batches.values()]
    b, c, r = len(lots), len(lots[0]), len(lots[0][0])
    assert all(len(lot) == c and all(len(cask) == r for cask in lot) for lot in lots), "balanced"
    cask = [[sum(y) / r for y in lot] for lot in lots]
    lot = [sum(m) / c for m in cask]
    centre = sum(lot) / b
    between = c * r * sum((m - centre) ** 2 for m in lot) / (b - 1)
    inside = r * sum((m - lot[i]) ** 2 for i in range(b) for m in cask[i]) / (b * (c - 1))
    residual = sum((y - cask[i][j]) ** 2 for i in range(b) for j in range(c) for y in lots[i][j]) / (b * c * (r - 1))
    blocks = [matrix([y for one in each for y in one]) for each in lots]
    design = matrix([[1]] * (c * r))

    def covariance(f):
        return matrix([[f[0] * (i // r == j // r) + f[1] + f[2] * (i == j) for j in range(c * r)] for i in range(c * r)])

    figures = [(inside - residual) / r, (between - inside) / (c * r), residual]
    stationary(lambda f: deviance(blocks, design, covariance(f), True)[0], figures)
    value, mean, error = deviance(blocks, design, covariance(figures), True)
    return name, True, mean, error, matrix([[figures[0]]]), figures[1], residual, value


def cells(model, restricted, mean, error, within, between, residual, value):
    two = mean.rows > 1
    spread = [sqrt(within[i, i]) for i in range(mean.rows)]
    correlation = within[0, 1] / (spread[0] * spread[1]) if two and spread[1] else mpf(0)
    figures = [
        mean[0], mean[1] if two else mpf(0), sqrt(error[0, 0]), sqrt(error[1, 1]) if two else mpf(0), spread[0], spread[1] if two else mpf(0),
        correlation, sqrt(between), sqrt(residual), value]
    return [model, "REML" if restricted else "ML"] + [mp.nstr(figure, 16) for figure in figures]


with open("nested-models.csv", "w") as table:
    table.write("# Made by make_nested_models.py with mpmath 1.2.1, 40 digits, 16 given; spreads and residual are standard deviations.\n")
    table.write("model,likelihood,mean0,mean1,error0,error1,within0,within1,correlation,between0,residual,deviance\n")
    for found in [
        free("sleepstudy", 2, True), free("sleepstudy", 2, False), independent("sleepstudy"), level_only("sleepstudy"),
        free("dyestuff", 1, True), free("dyestuff", 1, False), free("dyestuff2", 1, True), free("dyestuff2", 1, False), nested("pastes"),
    ]:
        table.write(",".join(cells(*found)) + "\n")
