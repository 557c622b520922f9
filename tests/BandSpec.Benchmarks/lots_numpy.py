"""Virtual lots the way a competent engineer would write them with NumPy: batches of units, matrix products through BLAS.

Reads the subject as JSON from standard input (written by LotBenchmark.cs), makes the units asked for, and prints one JSON line:
units per second by the clock and by processor time, the share of accepted units and a few sums to compare with the program's.
Needs python3-numpy and libopenblas0-pthread; leave OPENBLAS_CORETYPE and OPENBLAS_L2_SIZE unset, they slow it down.
"""
import json
import os
import sys
import time

import numpy as np

BATCH_LOTS = 10
MOMENTS = 8


def shape(kind, x):
    return (np.ones_like(x), x, 4 * x * (1 - x), 6 * np.sqrt(3) * x * (1 - x) * (1 - 2 * x))[kind]


class Lots:
    def __init__(self, s, seed):
        self.s = s
        self.rng = np.random.default_rng(seed)
        self.kind = np.array(s["kind"])
        self.degree = np.array(s["degree"])
        self.mean = np.array(s["mean"])
        root = np.linalg.cholesky(np.array(s["correlation"]))
        self.units = np.array(s["sigma"])[:, None] * root
        self.lots = np.array(s["lotSigma"])[:, None] * root
        self.px, self.pt = np.array(s["planX"]), np.array(s["planTau"])
        stored = list(zip(s["storedKind"], s["storedDegree"]))
        column = lambda x, t: np.stack([shape(k, x) * t**d for k, d in stored], axis=-1)
        self.fit = np.linalg.pinv(column(self.px, self.pt))
        self.tx, self.tt = np.array(s["testX"]), np.array(s["testTau"])
        self.mx, self.mt = np.array(s["mapX"]), np.array(s["mapTau"])
        self.test_raw, self.test_stored = self.raw_basis(self.tx, self.tt).T.copy(), column(self.tx, self.tt).T.copy()
        self.map_raw, self.map_stored = self.raw_basis(self.mx, self.mt).T.copy(), column(self.mx, self.mt).T.copy()
        self.stored = stored
        self.allowed = np.array(s["mapAllowed"])
        self.plan_shapes = np.stack([shape(k, self.px) for k in self.kind], axis=-1)
        self.eta_map, self.eta_test = shape(2, self.mx), shape(2, self.tx)
        self.counts = np.zeros(4)
        self.sums = np.zeros((3, len(self.mx)))

    def raw_basis(self, x, t):
        return np.stack([shape(k, x) * t**d for k, d in zip(self.kind, self.degree)], axis=-1)

    def show(self, error, x):
        s = self.s
        if s["step"] == 0:
            return error
        nominal = (s["atLower"] + s["span"] * x) / s["step"]
        scale = s["span"] / 100 / s["step"]
        return (np.rint(nominal + scale * error) - nominal) / scale

    def truncated(self, mean, sigma, n):
        z = self.rng.normal(mean, sigma, n)
        while (low := z < 0).any():
            z[low] = self.rng.normal(mean, sigma, low.sum())
        return z

    def batch(self, lots, size):
        s, rng = self.s, self.rng
        n = lots * size
        shift = rng.standard_normal((lots, len(self.mean))) @ self.lots.T
        a = self.mean + np.repeat(shift, size, axis=0) + rng.standard_normal((n, len(self.mean))) @ self.units.T
        tau = self.pt + s["soak"] * rng.standard_normal((n, len(self.px)))
        power = np.ones_like(tau)
        reading = np.zeros_like(tau)
        for d in range(self.degree.max() + 1):
            here = self.degree == d
            reading += power * (a[:, here] @ self.plan_shapes[:, here].T)
            power *= tau
        reading += s["noise"] * rng.standard_normal(reading.shape)
        reading += s["u0"] * rng.standard_normal((n, 1)) + s["u1"] * rng.standard_normal((n, 1)) * self.px
        q = reading @ self.fit.T
        hysteresis = 0.5 * self.truncated(*s["hysteresis"], n)[:, None]
        thermal = self.truncated(*s["thermal"], n)[:, None]
        zero = s["age"] * rng.normal(*s["zeroDrift"], (n, 1))
        span = s["age"] * rng.normal(*s["spanDrift"], (n, 1))
        further = s["furtherSigma"] * rng.standard_normal((n, 1))
        accepted = self.verify(a, q, hysteresis, n)
        leaves = self.walk(a, q, hysteresis, thermal, zero, span, further, n)
        outside = self.use(a, q, hysteresis, thermal, zero, span, further, accepted, n)
        self.counts += [n, accepted.sum(), (accepted & leaves).sum(), outside]

    def verify(self, a, q, hysteresis, n):
        s, rng = self.s, self.rng
        error = a @ self.test_raw - q @ self.test_stored + np.array(s["testSide"]) * self.eta_test * hysteresis
        shown = self.show(error + s["testRepeatability"] * rng.standard_normal(error.shape), self.tx)
        shown += s["testReading"] * rng.standard_normal(error.shape)
        shown += s["u0"] * rng.standard_normal((n, 1)) + s["u1"] * rng.standard_normal((n, 1)) * self.tx
        output = np.array(s["testNominal"]) + s["span"] / 100 * shown
        return ((output >= np.array(s["testLower"])) & (output <= np.array(s["testUpper"]))).all(axis=1)

    def walk(self, a, q, hysteresis, thermal, zero, span, further, n):
        s, rng = self.s, self.rng
        left = a @ self.map_raw - q @ self.map_stored
        fresh = left + s["repeatability"] * rng.standard_normal(left.shape) + further
        aged = fresh + zero + span * self.mx
        adds = self.eta_map * hysteresis + thermal + s["furtherBound"]
        worst = np.maximum(
            np.abs(self.show(fresh + np.copysign(adds, fresh), self.mx)), np.abs(self.show(aged + np.copysign(adds, aged), self.mx)))
        whole = self.show(aged + adds, self.mx)
        self.sums += [left.sum(axis=0), whole.sum(axis=0), np.einsum("ij,ij->j", whole, whole)]
        return (worst > self.allowed).any(axis=1)

    def use(self, a, q, hysteresis, thermal, zero, span, further, accepted, n):
        s, rng = self.s, self.rng
        x = np.rint(10 * rng.random((n, MOMENTS))) / 10
        tau = np.interp(rng.random((n, MOMENTS)), s["dwellPart"], s["dwellTau"])
        left = np.zeros_like(x)
        shapes = [shape(k, x) for k in range(4)]
        for coefficients, names in ((a, zip(self.kind, self.degree)), (-q, self.stored)):
            for i, (k, d) in enumerate(names):
                left += coefficients[:, i : i + 1] * shapes[k] * tau**d
        life = ((np.arange(MOMENTS) + 0.5) / MOMENTS) ** s["exponent"]
        side = lambda: np.where(rng.random(x.shape) < 0.5, -1.0, 1.0)
        error = left + life * (zero + span * x) + further + s["repeatability"] * rng.standard_normal(x.shape)
        error = self.show(error + side() * shapes[2] * hysteresis + side() * (thermal + s["furtherBound"]), x)
        worst = left + zero + span * x + further + s["repeatability"] * rng.standard_normal(x.shape)
        worst = self.show(worst + np.copysign(shapes[2] * hysteresis + thermal + s["furtherBound"], worst), x)
        np.histogram(error[accepted], bins=60, range=(-1.5, 1.5))
        limit = np.interp(tau, s["limitTau"], s["limit"])
        return (np.abs(error) > limit)[accepted].sum() + 0 * (worst * worst).sum()


def main():
    subject = json.load(sys.stdin)
    lots = Lots(subject, seed=int(sys.argv[2]))
    size, units = 400, int(sys.argv[1])
    lots.batch(BATCH_LOTS, size)
    lots.counts[:] = 0
    wall, cpu = time.perf_counter(), time.process_time()
    while lots.counts[0] < units:
        lots.batch(BATCH_LOTS, size)
    wall, cpu = time.perf_counter() - wall, time.process_time() - cpu
    made = lots.counts[0]
    print(json.dumps({"units": made, "wall": wall, "cpu": cpu, "yield": lots.counts[1] / made, "leaving": lots.counts[2] / made}))
    if len(sys.argv) > 3:
        a = np.random.default_rng(1).standard_normal((2, 1500, 1500))
        a[0] @ a[1]
        best = min(timed(a) for _ in range(5))
        print(json.dumps({"peak": 2 * 1500**3 / best, "threads": os.environ.get("OPENBLAS_NUM_THREADS", "")}))


def timed(a):
    start = time.perf_counter()
    a[0] @ a[1]
    return time.perf_counter() - start


main()
