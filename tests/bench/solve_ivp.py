"""Times solve_ivp with LSODA and an event on cases given as JSON; answers in JSON.

In:  {"cases": [{"k", "kd", "dose", "km"}...], "tolerances": [...], "S0", "Kic", "y", "target"}, SI units.
Out: {"scipy": version, "runs": [{"rtol", "seconds": [...], "times": [...]}...]}, the fastest of three solves a case.
"""
import json
import sys
import time

import scipy
from scipy.integrate import solve_ivp

asked = json.load(sys.stdin)
S0, Kic, y, target = asked["S0"], asked["Kic"], asked["y"], asked["target"]


def solve(case, rtol):
    k, kd, km = case["k"], case["kd"], case["km"]

    def rate(t, state):
        s, e = state
        v = k * e * s / (km * (1 + y * (S0 - s) / Kic) + s)
        return (-v, -kd * e)

    def reached(t, state):
        return state[0] - target

    reached.terminal = True
    # Every case reaches its target within 86 h.
    result = solve_ivp(
        rate,
        (0.0, 100 * 3600.0),
        (S0, case["dose"]),
        method="LSODA",
        events=reached,
        rtol=rtol,
        atol=(rtol * S0 / 100, rtol * case["dose"] / 100),
    )
    found = result.t_events[0]
    return float(found[0]) if len(found) else None


runs = []
for rtol in asked["tolerances"]:
    seconds, times = [], []
    solve(asked["cases"][0], rtol)
    for case in asked["cases"]:
        taken = []
        for _ in range(3):
            start = time.perf_counter()
            answer = solve(case, rtol)
            taken.append(time.perf_counter() - start)
        seconds.append(min(taken))
        times.append(answer)
    runs.append({"rtol": rtol, "seconds": seconds, "times": times})
print(json.dumps({"scipy": scipy.__version__, "runs": runs}))
