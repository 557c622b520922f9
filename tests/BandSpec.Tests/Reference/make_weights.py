"""Least-squares weights of three compensation plans by NumPy's pseudo-inverse.

Writes weights.csv: one row a plan and place; the columns say how it was made. Run with Debian's python3-numpy:
    python3 make_weights.py > weights.csv
"""
import sys
import numpy as np

T_REF, T_R = 25.0, 25.0
PLANS = [([-20, 60, 150], 2, 2), ([-15, 25, 90, 145], 3, 2), ([-20, 10, 50, 95, 150], 4, 3)]
PLACES = [(0.0, -20.0), (0.3, 0.0), (0.5, 72.5), (0.9, 110.0), (1.0, 150.0)]
REFERENCE, OTHERS = [0, 0.5, 1], [0, 1]


def row(x, t, dz, ds):
    tau = (t - T_REF) / 100
    return [tau**k for k in range(dz + 1)] + [x * tau**k for k in range(ds + 1)] + [4 * x * (1 - x)]


print(f"# made by make_weights.py with NumPy {np.__version__}, 17 digits")
print("plan,pressure-fraction,temperature,weights of the readings in the order of the plan's points")
for p, (temperatures, dz, ds) in enumerate(PLANS):
    nearest = min(temperatures, key=lambda t: (abs(t - T_R), t))
    points = [(x, t) for t in temperatures for x in (REFERENCE if t == nearest else OTHERS)]
    pinv = np.linalg.pinv(np.array([row(x, t, dz, ds) for x, t in points]))
    for x, t in PLACES:
        weights = np.array(row(x, t, dz, ds)) @ pinv
        print(",".join([str(p), repr(x), repr(t)] + [f"{w:.17g}" for w in weights]))
