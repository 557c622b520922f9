"""Makes noncentral-t.csv and chi-square.csv for NoncentralT.cs and ChiSquared.cs.

Run: /usr/bin/python3 make_noncentral_t.py      Needs: mpmath, SciPy (python3-mpmath, python3-scipy), R (r-base-core)

The figures are mpmath's, both tails separately, to 17 digits.  Noncentral t: quadrature of Owen's integral over the standard deviation,
the integrand scaled by its peak so that small tails keep their digits.  SciPy and R stand beside as witnesses; both work to an absolute
error (R also stops at a noncentrality of 37.62), so their small tails are wrong; the tables say how far each agrees.
"""
import platform
import subprocess
import mpmath as mp
import scipy
from scipy.stats import chi2, nct

mp.mp.dps = 32


def log_chi(x, nu):
    return mp.log(2) + nu / 2 * mp.log(nu / 2) - mp.loggamma(nu / 2) + (nu - 1) * mp.log(x) - nu * x * x / 2


def log_normal(z):
    if z > -30:
        return mp.log(mp.erfc(-z / mp.sqrt(2)) / 2)
    tail = mp.quad(lambda t: mp.exp(z * t - t * t / 2), [0, -1 / z, -4 / z, -20 / z, -130 / z])
    return mp.log(tail / mp.sqrt(2 * mp.pi)) - z * z / 2


def tail(t, nu, delta, sign):
    """P(T <= t) for sign +1, P(T > t) for -1: the integral of chi density times Phi(sign (t x - delta)) over x = s/sigma."""
    g = lambda x: log_chi(x, nu) + log_normal(sign * (t * x - delta))
    low, high = mp.mpf(0), 1 + mp.sqrt(2000 / nu) + abs(delta)
    a, b = low + mp.mpf(10)**-30, high
    for _ in range(60):
        c, d = a + (b - a) * mp.mpf('0.382'), a + (b - a) * mp.mpf('0.618')
        a, b = (c, b) if g(c) < g(d) else (a, d)
    peak = (a + b) / 2
    top = g(peak)

    def edge(outside):
        inside = peak
        if g(outside) > top - 80:
            return outside
        for _ in range(40):
            middle = (inside + outside) / 2
            inside, outside = (middle, outside) if g(middle) > top - 80 else (inside, middle)
        return outside

    first, last = edge(low + mp.mpf(10)**-30), edge(high)
    first = mp.mpf(0) if first < mp.mpf(10)**-29 else first
    cuts = [first + (peak - first) * k / 6 for k in range(6)] + [peak + (last - peak) * k / 6 for k in range(7)]
    if t != 0:
        cuts = sorted(set(cuts + [c for c in (delta / t + k / abs(t) for k in (-6, -3, -1, 0, 1, 3, 6)) if first < c < last]))
    return mp.exp(top) * mp.quad(lambda x: mp.exp(g(x) - top) if x > 0 else mp.mpf(0), cuts, method='gauss-legendre')


def r_values(function, rows):
    text = "".join(f"cat(sprintf('%.17g %.17g\\n', suppressWarnings({function}({row})), suppressWarnings({function}({row}, lower.tail=FALSE))))\n" for row in rows)
    out = subprocess.run(["Rscript", "/dev/stdin"], input=text, capture_output=True, text=True, check=True).stdout
    return [tuple(float(v) for v in line.split()) for line in out.splitlines()]


def certificate(title):
    version = subprocess.run(["Rscript", "-e", "cat(as.character(getRversion()))"], capture_output=True, text=True, check=True).stdout
    return (f"# {title}\n# made by make_noncentral_t.py with mpmath {mp.__version__} at {mp.mp.dps} digits; witnesses SciPy {scipy.__version__}, "
            f"R {version}; Python {platform.python_version()}\n")


def agreement(rows):
    for who, index in (("SciPy", 2), ("R", 3)):
        for level in (1e-6, 1e-12, 1e-290):
            worst = max(abs(w / float(e) - 1) for row in rows for w, e in zip(row[index], row[1]) if level <= e)
            yield f"# {who} agrees within {worst:.1e} relative where the tail is at least {level:g}\n"


def write(name, title, head, rows):
    with open(name, "w") as out:
        out.write(certificate(title))
        out.writelines(agreement(rows))
        out.write(head + ",lower,upper,scipy-lower,scipy-upper,r-lower,r-upper\n")
        for given, exact, scipys, rs in rows:
            out.write(",".join([repr(float(v)) for v in given] + [mp.nstr(v, 17) for v in exact] + [repr(float(v)) for v in (*scipys, *rs)]) + "\n")


cases = []
for nu in (1, 2, 4, 9, 19, 29, 49, 99, 499, 9999, 99999):
    for delta in (0, 0.5, -2, 8, 15 if nu < 100 else 30, 4 * (nu + 1) ** 0.5):
        spread = (1 + delta * delta / (2 * nu)) ** 0.5
        for steps in (-12, -5, -2, -0.5, 1, 3, 8, 30):
            cases.append((nu, delta, delta + steps * spread))
cases = [c for i, c in enumerate(cases) if i % 5 == 0] + [(9, 3.0, 0.0), (9, -40.0, -60.0), (4, 30.0, 1.0)]
exact = [(tail(mp.mpf(t), mp.mpf(nu), mp.mpf(delta), 1), tail(mp.mpf(t), mp.mpf(nu), mp.mpf(delta), -1)) for nu, delta, t in cases]
for (nu, delta, t), (low, up) in zip(cases, exact):
    assert abs(low + up - 1) < mp.mpf(10)**-18, (nu, delta, t, low + up - 1)
rs = r_values("pt", [f"{t!r},{nu!r},{delta!r}" for nu, delta, t in cases])
scipys = [(nct.cdf(t, nu, delta), nct.sf(t, nu, delta)) for nu, delta, t in cases]
write("noncentral-t.csv", "noncentral t distribution, both tails; 17 digits", "nu,delta,t", list(zip(cases, exact, scipys, rs)))

cases = [(nu, nu * x) for nu in (1, 2, 5, 9, 42, 199, 9999, 1000000)
         for x in (1 + k * (2 / nu) ** 0.5 for k in (-20, -6, -3, -1.2, -0.6, 0, 0.4, 1, 3, 8, 20)) if x > 0] + [(1, 1e-9), (5, 0.01), (9, 250.0)]


def gamma_tails(nu, x):
    a, y = mp.mpf(nu) / 2, mp.mpf(x) / 2
    f = lambda s: mp.exp(log_chi(s, mp.mpf(nu)) - top)
    s = mp.sqrt(mp.mpf(x) / nu)
    result = []
    for inside in ((mp.mpf(0), s), (s, s + 60 / mp.sqrt(nu) + 1)):
        mode = mp.sqrt(mp.mpf(nu - 1) / nu)
        top = log_chi(min(max(mode, inside[0]), inside[1]) if nu > 1 else max(inside[0], mp.mpf(10)**-30), mp.mpf(nu))
        marks = sorted({inside[0], inside[1]} | {m for m in (mode + k / mp.sqrt(2 * nu) for k in range(-40, 41)) if inside[0] < m < inside[1]}
                       | {m for m in (s + sign * k / mp.sqrt(2 * nu) / 8 for k in range(1, 20) for sign in (-1, 1)) if inside[0] < m < inside[1]})
        result.append(mp.exp(top) * mp.quad(lambda v: f(v) if v > 0 else (f(mp.mpf(10)**-40) if nu == 1 else mp.mpf(0)), marks, method='gauss-legendre'))
    return tuple(result)


exact = [gamma_tails(nu, x) for nu, x in cases]
for (nu, x), (low, up) in zip(cases, exact):
    assert abs(low + up - 1) < mp.mpf(10)**-18, (nu, x, low + up - 1)
rs = r_values("pchisq", [f"{x!r},{nu!r}" for nu, x in cases])
scipys = [(chi2.cdf(x, nu), chi2.sf(x, nu)) for nu, x in cases]
write("chi-square.csv", "chi-square distribution, both tails; 17 digits", "nu,x", list(zip(cases, exact, scipys, rs)))
