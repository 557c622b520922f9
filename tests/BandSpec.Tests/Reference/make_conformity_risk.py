"""Makes conformity-risk.csv: global risks of JCGM 106:2012 for ConformityRisk.cs.

Run: /usr/bin/python3 make_conformity_risk.py      Needs: mpmath, SciPy (python3-mpmath, python3-scipy)

The figures are mpmath's: one-dimensional quadrature of the joint normal law with 80 digits.  The last column is the largest absolute
difference to SciPy's bivariate normal distribution function on the same rectangles; that routine's own error is about 1e-8.
"""
import platform
import mpmath as mp
import scipy
from scipy.stats import multivariate_normal

mp.mp.dps = 80  # quad stops on an absolute error, and the smallest risk is 1e-39
FAR = 1e3

# mean, sigma, u, tolerance, acceptance
CASES = [
    (1500, 0.12, 0.04, (1499.8, 1500.2), (1499.72, 1500.28)),
    (1500, 0.12, 0.04, (1499.8, 1500.2), (1499.8, 1500.2)),
    (1500, 0.12, 0.04, (1499.8, 1500.2), (1499.82, 1500.18)),
    (1500, 0.12, 0.04, (1499.8, 1500.2), (1499.88, 1500.12)),
    (0, 0.25, 0.05, (-1, 1), (-1, 1)),
    (0, 0.25, 0.05, (-1, 1), (-0.9, 0.9)),
    (0, 0.20, 0.05, (-1, 1), (-0.9, 0.9)),
    (0, 0.15, 0.02, (-1, 1), (-0.96, 0.96)),
    (0.3, 0.15, 0.05, (-1, 1), (-0.9, 0.9)),
    (-0.5, 0.2, 0.1, (-1, 1), (-0.8, 0.8)),
    (2.0, 0.2, 0.1, (-1, 1), (-0.9, 0.9)),
    (0, 1.0, 0.001, (-1, 1), (-0.999, 0.999)),
    (0, 0.001, 1.0, (-1, 1), (-0.9, 0.9)),
    (0, 0.5, 0.5, (-1, 1), (-0.25, 0.25)),
    (0, 0.125, 0.05, (-1, 1), (-0.5, 0.5)),
    (0, 0.2, 0.05, (-1, 1), (-0.5, 0.5)),
    (0.1, 0.3, 0.06, (-1, 2), (-0.9, 1.7)),
    (0.1, 0.3, 0.06, (-FAR, 1), (-FAR, 0.9)),
    (0, 0.3, 0.1, (-1, 1), (-1.5, 1.5)),
    (0.2, 0.1, 0.03, (0, 0.35), (0.1, 0.1001)),
]


def cdf(z):
    return mp.erfc(-z / mp.sqrt(2)) / 2


def between(low, high):
    return cdf(high) - cdf(low) if high < 0 else cdf(-low) - cdf(-high)


def cuts(low, high, mean, sigma, u, edges):
    marks = {low, high}
    for centre, scale in [(mean, sigma)] + [(e, u) for e in edges]:
        marks |= {centre + scale * k for k in (-30, -20, -14, -10, -7, -5, -3, -2, -1, 0, 1, 2, 3, 5, 7, 10, 14, 20, 30)}
    return sorted(m for m in marks if low <= m <= high)


def joint(mean, sigma, u, truth, reading):
    low, high = max(truth[0], mean - 45 * sigma), min(truth[1], mean + 45 * sigma)
    if low >= high:
        return mp.mpf(0)
    f = lambda y: mp.npdf(y, mean, sigma) * between((reading[0] - y) / u, (reading[1] - y) / u)
    return mp.quad(f, cuts(low, high, mean, sigma, u, reading))


def scipy_joint(mean, sigma, u, truth, reading):
    law = multivariate_normal([mean, mean], [[sigma**2, sigma**2], [sigma**2, sigma**2 + u**2]], allow_singular=True)
    (a, b), (c, d) = truth, reading
    return law.cdf([b, d]) - law.cdf([a, d]) - law.cdf([b, c]) + law.cdf([a, c])


with open("conformity-risk.csv", "w") as out:
    out.write("# global risks: consumer, producer, accepted, conforming; an end of 1000 in size stands for no limit; 17 digits\n")
    out.write(f"# made by make_conformity_risk.py with mpmath {mp.__version__} at {mp.mp.dps} digits, witness SciPy {scipy.__version__}, Python {platform.python_version()}\n")
    out.write("mean,sigma,u,tolerance-lower,tolerance-upper,acceptance-lower,acceptance-upper,consumer,producer,accepted,conforming,scipy-difference\n")
    for mean, sigma, u, tolerance, acceptance in CASES:
        exact = lambda v: mp.mpf(float(v))
        m, s, w = exact(mean), exact(sigma), exact(u)
        t, a = [exact(v) for v in tolerance], [exact(v) for v in acceptance]
        below, above = lambda i: (mp.mpf(-10**6), i[0]), lambda i: (i[1], mp.mpf(10**6))
        consumer = joint(m, s, w, below(t), a) + joint(m, s, w, above(t), a)
        producer = joint(m, s, w, t, below(a)) + joint(m, s, w, t, above(a))
        total = mp.sqrt(s * s + w * w)
        accepted, conforming = between((a[0] - m) / total, (a[1] - m) / total), between((t[0] - m) / s, (t[1] - m) / s)
        inside = scipy_joint(mean, sigma, u, tolerance, acceptance)
        witness = max(abs(inside - float(accepted - consumer)), abs(inside - float(conforming - producer)))
        numbers = [repr(float(v)) for v in (mean, sigma, u, *tolerance, *acceptance)] + [mp.nstr(v, 17) for v in (consumer, producer, accepted, conforming)]
        out.write(",".join(numbers) + f",{witness:.1e}\n")
