"""Plane frames assembled and solved with scipy.sparse, vectorised over members: a second opinion on displacements, and
the time it takes. Reads a list of models as JSON, writes displacements and milliseconds."""
import json
import sys
import time

import numpy as np
from scipy.sparse import coo_matrix
from scipy.sparse.linalg import spsolve


def solve(model):
    xy = np.array(model["joints"], dtype=float)
    start, end = (np.array([m[k] for m in model["members"]], dtype=int) for k in (0, 1))
    EA, EI = (np.array([m[k] for m in model["members"]], dtype=float) for k in (2, 3))
    index = {name: i for i, name in enumerate(model["names"])}
    q = np.zeros(len(EA))
    for name, value in model["uniform"]:
        q[index[name]] += value
    begun = time.perf_counter()
    n = 3 * len(xy)
    d = xy[end] - xy[start]
    L = np.hypot(d[:, 0], d[:, 1])
    c, s = d[:, 0] / L, d[:, 1] / L
    k = np.zeros((len(L), 6, 6))
    a, b, e, f = EA / L, 12 * EI / L**3, 6 * EI / L**2, 4 * EI / L
    k[:, 0, 0] = k[:, 3, 3] = a
    k[:, 0, 3] = k[:, 3, 0] = -a
    k[:, 1, 1] = k[:, 4, 4] = b
    k[:, 1, 4] = k[:, 4, 1] = -b
    k[:, 2, 2] = k[:, 5, 5] = f
    k[:, 2, 5] = k[:, 5, 2] = f / 2
    for i, sign in ((1, 1), (4, -1)):
        for j in (2, 5):
            k[:, i, j] = k[:, j, i] = sign * e
    T = np.zeros_like(k)
    for o in (0, 3):
        T[:, o, o] = T[:, o + 1, o + 1] = c
        T[:, o, o + 1], T[:, o + 1, o] = s, -s
        T[:, o + 2, o + 2] = 1
    K = T.transpose(0, 2, 1) @ k @ T
    dof = np.hstack([3 * start[:, None] + np.arange(3), 3 * end[:, None] + np.arange(3)])
    rows = np.repeat(dof, 6, axis=1).ravel()
    cols = np.tile(dof, (1, 6)).ravel()
    # Uniform load q downwards per metre of member: components along and across, and the fixed-end moments.
    across, along = -q * c, -q * s
    local = np.zeros((len(L), 6))
    local[:, 0] = local[:, 3] = along * L / 2
    local[:, 1] = local[:, 4] = across * L / 2
    local[:, 2], local[:, 5] = across * L**2 / 12, -across * L**2 / 12
    F = np.zeros(n)
    np.add.at(F, dof.ravel(), (T.transpose(0, 2, 1) @ local[:, :, None]).ravel())
    for joint, fx, fy in model["forces"]:
        F[3 * joint] += fx
        F[3 * joint + 1] += fy
    free = np.ones(n, dtype=bool)
    for joint in model["fixed"]:
        free[3 * joint : 3 * joint + 3] = False
    number = np.cumsum(free) - 1
    keep = free[rows] & free[cols]
    m = int(free.sum())
    A = coo_matrix((K.ravel()[keep], (number[rows[keep]], number[cols[keep]])), shape=(m, m)).tocsc()
    u = np.zeros(n)
    u[free] = spsolve(A, F[free])
    return u.reshape(-1, 3), 1000 * (time.perf_counter() - begun)


def best(model, seconds):
    times, u = [], None
    stop = time.perf_counter() + seconds
    while len(times) < 5 or time.perf_counter() < stop:
        u, ms = solve(model)
        times.append(ms)
    late = sorted(times[len(times) // 3 :])
    return {"displacements": u.tolist(), "ms": late[len(late) // 4]}


with open(sys.argv[1], encoding="utf8") as file:
    seconds = float(sys.argv[2]) if len(sys.argv) > 2 else 0
    json.dump([best(model, seconds) for model in json.load(file)], sys.stdout)
