"""Makes normal-tail-chebyshev.txt (coefficients for NormalDistribution.cs) and normal-tail.csv (the table it is tested against).

Run: /usr/bin/python3 make_normal_tail.py      Needs: mpmath (python3-mpmath)

The scaled tail S(x) = exp(x^2/2) Q(x), x >= 0, is smooth and falls like 1/(x sqrt(2 pi)).  With t = (x - 5)/(x + 5) the
half line becomes [-1, 1), and (x + 1) S(x) has a Chebyshev series in t whose terms fall below 2e-17 of the value after 24.
"""
import platform
import mpmath as mp

mp.mp.dps = 50
SHIFT, TERMS, SAMPLES = mp.mpf(5), 24, 64


def scaled_tail(x):
    """exp(x^2/2) Q(x), by the integral of exp(-x t - t^2/2) where erfc would underflow."""
    if x > 60:
        return mp.quad(lambda t: mp.exp(-x * t - t * t / 2), [0, 1 / x, 4 / x, 10 / x, 60 / x, 200 / x]) / mp.sqrt(2 * mp.pi)
    return mp.erfc(x / mp.sqrt(2)) / 2 * mp.exp(x * x / 2)


def coefficients():
    angles = [mp.pi * (k + mp.mpf(1) / 2) / SAMPLES for k in range(SAMPLES)]
    points = [SHIFT * (1 + mp.cos(a)) / (1 - mp.cos(a)) for a in angles]
    values = [(x + 1) * scaled_tail(x) for x in points]
    return [2 / mp.mpf(SAMPLES) * sum(v * mp.cos(j * a) for v, a in zip(values, angles)) for j in range(TERMS)]


def certificate(title):
    return f"# {title}\n# made by make_normal_tail.py with mpmath {mp.__version__} at {mp.mp.dps} digits, Python {platform.python_version()}\n"


with open("normal-tail-chebyshev.txt", "w") as out:
    out.write(certificate("Chebyshev coefficients of (x + 1) exp(x^2/2) Q(x) in t = (x - 5)/(x + 5); the first is halved in use"))
    out.writelines(mp.nstr(c, 20) + "\n" for c in coefficients())

with open("normal-tail.csv", "w") as out:
    out.write(certificate("upper tail Q(z) of the standard normal, its logarithm, and z back from Q; 20 digits"))
    out.write("z,upper-tail,log-upper-tail\n")
    for text in ("-8 -5 -2.5 -1 -0.1 0 0.001 0.1 0.25 0.5 0.75 1 1.28 1.64 1.645 1.65 1.96 2 2.58 3 3.5 4 4.5 5 5.5 6 7 8 9.5 10 12 15 "
                 "18.25 20 25 30 33.3 35 37 37.5 40 60 100 1000").split():
        z = mp.mpf(float(text))
        log_tail = mp.log(scaled_tail(z)) - z * z / 2 if z > 0 else mp.log(mp.erfc(z / mp.sqrt(2)) / 2)
        out.write(f"{float(text)!r},{mp.nstr(mp.exp(log_tail), 20)},{mp.nstr(log_tail, 20)}\n")
