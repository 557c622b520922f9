"""Makes michelso.csv and anderson-darling.csv for Moments.cs and AndersonDarling.cs.

Run: /usr/bin/python3 make_anderson_darling.py      Needs: mpmath, NumPy, SciPy, R (r-base-core)

Readings: StRD Michelso as base R's morley; a normal, a skewed and a heavy-tailed sample drawn by NumPy and rounded to 4 decimals; for each
the statistic of SciPy, the same with 40 digits of mpmath, the 1986 adjustment and p-value by formula.
"""
import platform
import subprocess
import mpmath as mp
import numpy as np
import scipy
from scipy import stats

mp.mp.dps = 40
r = lambda code: subprocess.run(["Rscript", "-e", code], capture_output=True, text=True, check=True).stdout
version = r("cat(as.character(getRversion()))")
michelso = [float(v) for v in r("cat(sprintf('%.2f', datasets::morley$Speed/1000 + 299))").split()]
with open("michelso.csv", "w") as out:
    out.write(f"# StRD Michelso, speed of light in 1000 km/s, measured 1879\n# made by make_anderson_darling.py from datasets::morley of R {version}\nspeed\n")
    out.writelines(f"{v:.2f}\n" for v in michelso)


def statistic(values):
    x = sorted(mp.mpf(v) for v in values)
    n = len(x)
    mean = mp.fsum(x) / n
    s = mp.sqrt(mp.fsum((v - mean)**2 for v in x) / (n - 1))
    cdf = lambda z: mp.erfc(-z / mp.sqrt(2)) / 2
    z = [(v - mean) / s for v in x]
    return -n - mp.fsum((2 * i + 1) * (mp.log(cdf(z[i])) + mp.log(cdf(-z[n - 1 - i]))) for i in range(n)) / n


def p_value(a):
    if a < 0.2: return 1 - mp.exp(-13.436 + 101.14 * a - 223.73 * a * a)
    if a < 0.34: return 1 - mp.exp(-8.318 + 42.796 * a - 59.938 * a * a)
    if a < 0.6: return mp.exp(0.9177 - 4.279 * a - 1.38 * a * a)
    return mp.exp(1.2937 - 5.709 * a + 0.0186 * a * a) if a < 10 else mp.mpf("3.7e-24")


rng = np.random.default_rng(20260417)
samples = {"michelso": michelso, "normal": rng.normal(5, 2, 50), "skewed": rng.exponential(1, 40), "heavy-tailed": rng.standard_t(2, 200),
           "few": rng.normal(0, 1, 8)}
with open("anderson-darling.csv", "w") as out:
    out.write("# Anderson-Darling statistic A2, adjusted (1986), p-value, SciPy's A2; then the readings parted by blanks\n")
    out.write(f"# made by make_anderson_darling.py with mpmath {mp.__version__} at {mp.mp.dps} digits, SciPy {scipy.__version__}, NumPy {np.__version__}, "
              f"R {version}, Python {platform.python_version()}\n")
    out.write("name,statistic,adjusted,probability,scipy,readings\n")
    for name, values in samples.items():
        values = [float(f"{v:.4f}") for v in values]
        a, n = statistic(values), len(values)
        adjusted = a * (1 + 0.75 / mp.mpf(n) + 2.25 / mp.mpf(n)**2)
        out.write(f"{name},{mp.nstr(a, 17)},{mp.nstr(adjusted, 17)},{mp.nstr(p_value(adjusted), 17)},{stats.anderson(values).statistic!r},"
                  + " ".join(repr(v) for v in values) + "\n")
