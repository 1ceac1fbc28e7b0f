"""Brute-force values of information for two invented problems with large probabilities, by nested sampling and by quadrature.

Nested sampling: results are drawn; for each, the cost of every option is averaged over 200 000 prior samples weighted by the
likelihood of the results; the least of these averages is averaged over the results. Quadrature: the same integrals on grids,
with the failure probability given knowledge in closed form where there is one. Prints cases.csv.

numpy and scipy only; about two minutes.
"""

import numpy as np
from scipy.special import ndtr, ndtri

rng = np.random.default_rng(20240611)


def lognormal(mean, sd):
    spread = np.sqrt(np.log1p((sd / mean) ** 2))
    centre = np.log(mean) - 0.5 * spread**2
    return centre, spread


# --- problem "wall": two limit states, strength with nature, level and model factor all knowledge, drains on their own -------
S_CENTRE, S_SPREAD = lognormal(34, 5)
M_CENTRE, M_SPREAD = lognormal(1, 0.1)
KAPPA = 0.6
PRICES = np.array([0.0, 40.0, 25.0])


def strength(u):
    return np.exp(S_CENTRE + S_SPREAD * u)


def wall_costs(k0, a, k1, k2, drain):
    """Cost of failure of each option; sliding 1000, bearing 600, the dearest counts."""
    s = strength(np.sqrt(KAPPA) * k0 + np.sqrt(1 - KAPPA) * a)
    level = 2 * ndtr(k1)
    low = 0.25 * (1 + np.tanh(drain))
    model = np.exp(M_CENTRE + M_SPREAD * k2)
    out = []
    for heel, wide, h in ((1, 1, level), (1.2, 1.25, level), (1, 1, low)):
        sliding = model * heel * np.tan(np.radians(s)) / (0.32 + 0.09 * h * h) < 1
        bearing = wide * np.exp(0.11 * (s - 22)) / (1 + 0.8 * h) < 1
        out.append(np.where(sliding, 1000.0, np.where(bearing, 600.0, 0.0)))
    return np.array(out)


def wall_given_knowledge(k0, k1, k2):
    """E[cost | K] of each option: the strength that fails is in closed form; the drain's own level by quadrature."""
    k0, k1, k2 = np.broadcast_arrays(k0, k1, k2)
    level = 2 * ndtr(k1)
    model = np.exp(M_CENTRE + M_SPREAD * k2)

    def cost(heel, wide, h):
        slide = np.degrees(np.arctan((0.32 + 0.09 * h * h) / (model * heel)))
        bear = np.maximum(22 + np.log((1 + 0.8 * h) / wide) / 0.11, 1e-9)
        p = [ndtr(((np.log(x) - S_CENTRE) / S_SPREAD - np.sqrt(KAPPA) * k0) / np.sqrt(1 - KAPPA)) for x in (slide, bear)]
        return 1000 * p[0] + 600 * np.maximum(p[1] - p[0], 0)

    v = np.linspace(-8, 8, 161)
    w = np.exp(-0.5 * v * v)
    w /= w.sum()
    drains = sum(wi * cost(1, 1, 0.25 * (1 + np.tanh(vi))) for wi, vi in zip(w, v))
    return np.array([cost(1, 1, level), cost(1.2, 1.25, level), drains])


def theta_strength(k0):
    """E[strength | K]."""
    return np.exp(S_CENTRE + S_SPREAD * np.sqrt(KAPPA) * k0 + 0.5 * S_SPREAD**2 * (1 - KAPPA))


def normal_grid(n=161, reach=6):
    v = np.linspace(-reach, reach, n)
    w = np.exp(-0.5 * v * v)
    return v, w / w.sum()


def wall_by_quadrature():
    k0, w0 = normal_grid(241)
    k1, w1 = normal_grid(241)
    k2, w2 = normal_grid(61)
    cost = np.zeros((3, len(k0), len(k1)))
    perfect = 0.0
    best = np.zeros((len(k0), len(k1)))
    for x, w in zip(k2, w2):
        given = wall_given_knowledge(k0[:, None], k1[None, :], x)
        cost += w * given
        best += w * np.min(PRICES[:, None, None] + given, axis=0)
    weight = w0[:, None] * w1[None, :]
    total = PRICES[:, None, None] + cost
    today = np.sum(total * weight, axis=(1, 2))
    least = today.min()
    found = {f"cost of option {o}": today[o] for o in range(3)}
    found["perfect"] = least - np.sum(best * weight)
    by0 = np.sum(total * w1[None, None, :], axis=2)
    by1 = np.sum(total * w0[None, :, None], axis=1)
    found["know strength"] = least - np.sum(w0 * by0.min(axis=0))
    found["know level"] = least - np.sum(w1 * by1.min(axis=0))
    # results: mean of four strength tests, sd 4/2; one level reading, sd 0.3
    x0 = np.linspace(10, 75, 651)
    like0 = np.exp(-0.5 * ((x0[:, None] - theta_strength(k0)[None, :]) / 2.0) ** 2)
    like0 *= (x0[1] - x0[0]) / (2.0 * np.sqrt(2 * np.pi))
    x1 = np.linspace(-1.8, 3.8, 561)
    like1 = np.exp(-0.5 * ((x1[:, None] - 2 * ndtr(k1)[None, :]) / 0.3) ** 2)
    like1 *= (x1[1] - x1[0]) / (0.3 * np.sqrt(2 * np.pi))
    found["strength tests"] = least - np.sum(np.min(by0 @ (like0 * w0).T, axis=0))
    found["level reading"] = least - np.sum(np.min(by1 @ (like1 * w1).T, axis=0))
    joint = np.einsum("rk,okl->orl", like0 * w0, total)
    joint = np.einsum("orl,sl->ors", joint, like1 * w1)
    found["both"] = least - np.sum(joint.min(axis=0))
    return found


def wall_by_sampling(outer=4000, inner=200_000):
    k0, a, k1, k2, drain = rng.standard_normal((5, inner))
    total = PRICES[:, None] + wall_costs(k0, a, k1, k2, drain)
    least = total.mean(axis=1).min()
    theta, level = theta_strength(k0), 2 * ndtr(k1)
    found = {}
    for name, use0, use1 in (("strength tests", 1, 0), ("level reading", 0, 1), ("both", 1, 1)):
        minima = np.zeros(outer)
        for i in range(outer):
            log = np.zeros(inner)
            if use0:
                result = theta_strength(rng.standard_normal()) + 2.0 * rng.standard_normal()
                log -= 0.5 * ((result - theta) / 2.0) ** 2
            if use1:
                result = 2 * ndtr(rng.standard_normal()) + 0.3 * rng.standard_normal()
                log -= 0.5 * ((result - level) / 0.3) ** 2
            w = np.exp(log - log.max())
            minima[i] = (total @ w).min() / w.sum()
        found[name] = (least - minima.mean(), minima.std() / np.sqrt(outer))
    return found


# --- problem "years": ten years, a yearly load, two options; ground with nature, correlated knowledge -----------------------
YEARS = 10
LOAD_KAPPA = 0.3
RHO = 0.5  # of the knowledge of ground and load


def years_given_knowledge(kg, kl):
    """Cost of failure in ten years given knowledge: the nature of the ground by quadrature, the years independent given both.

    A year fails where load > ground + strength of the option; ground 2 + 0.5 U, load 1 + 0.4 U.
    """
    v, w = normal_grid(161, 8)
    out = []
    for extra in (0.0, 0.4):
        sum_ = 0
        for vi, wi in zip(v, w):
            ground = 2 + 0.5 * (np.sqrt(0.5) * kg + np.sqrt(0.5) * vi) + extra
            u = (ground - 1) / 0.4
            p = ndtr(-(u - np.sqrt(LOAD_KAPPA) * kl) / np.sqrt(1 - LOAD_KAPPA))
            sum_ = sum_ + wi * -np.expm1(YEARS * np.log1p(-np.minimum(p, 1 - 1e-15)))
        out.append(1000 * sum_)
    return np.array(out)


def years_by_quadrature():
    prices = np.array([0.0, 30.0])
    k, w = normal_grid(241)
    kg, e = k[:, None], k[None, :]
    kl = RHO * kg + np.sqrt(1 - RHO**2) * e
    weight = w[:, None] * w[None, :]
    total = prices[:, None, None] + years_given_knowledge(kg + 0 * e, kl)
    today = np.sum(total * weight, axis=(1, 2))
    least = today.min()
    found = {f"cost of option {o}": today[o] for o in range(2)}
    found["perfect"] = least - np.sum(total.min(axis=0) * weight)
    # three ground tests of sd 0.4 about 2 + 0.5 sqrt(0.5) kg
    x = np.linspace(-1, 5, 601)
    theta = 2 + 0.5 * np.sqrt(0.5) * k
    sd = 0.4 / np.sqrt(3)
    like = np.exp(-0.5 * ((x[:, None] - theta[None, :]) / sd) ** 2) * (x[1] - x[0]) / (sd * np.sqrt(2 * np.pi))
    ground = np.sum(total * w[None, None, :], axis=2)
    found["know ground"] = least - np.sum(w * ground.min(axis=0))
    found["ground tests"] = least - np.sum(np.min(ground @ (like * w).T, axis=0))
    # two winters of the load: error 0.1 and the nature of a year, about 1 + 0.4 sqrt(0.3) kl
    kl2 = k[:, None]
    kg2 = RHO * kl2 + np.sqrt(1 - RHO**2) * k[None, :]
    load = np.sum((prices[:, None, None] + years_given_knowledge(kg2, kl2 + 0 * kg2)) * w[None, None, :], axis=2)
    theta = 1 + 0.4 * np.sqrt(LOAD_KAPPA) * k
    sd = np.sqrt((0.1**2 + (1 - LOAD_KAPPA) * 0.4**2) / 2)
    x = np.linspace(-2, 4, 601)
    like = np.exp(-0.5 * ((x[:, None] - theta[None, :]) / sd) ** 2) * (x[1] - x[0]) / (sd * np.sqrt(2 * np.pi))
    found["load readings"] = least - np.sum(np.min(load @ (like * w).T, axis=0))
    found["know load"] = least - np.sum(w * load.min(axis=0))
    return found


def years_by_sampling(outer=4000, inner=100_000):
    kg, a = rng.standard_normal((2, inner))
    kl = RHO * kg + np.sqrt(1 - RHO**2) * rng.standard_normal(inner)
    prices = np.array([0.0, 30.0])
    load = 1 + 0.4 * (np.sqrt(LOAD_KAPPA) * kl + np.sqrt(1 - LOAD_KAPPA) * rng.standard_normal((YEARS, inner)))
    ground = 2 + 0.5 * np.sqrt(0.5) * (kg + a)
    total = np.array([prices[o] + 1000.0 * np.any(load > ground + extra, axis=0) for o, extra in enumerate((0.0, 0.4))])
    least = total.mean(axis=1).min()
    theta = 2 + 0.5 * np.sqrt(0.5) * kg
    sd = 0.4 / np.sqrt(3)
    minima = np.zeros(outer)
    for i in range(outer):
        result = 2 + 0.5 * np.sqrt(0.5) * rng.standard_normal() + sd * rng.standard_normal()
        w = np.exp(-0.5 * ((result - theta) / sd) ** 2)
        minima[i] = (total @ w).min() / w.sum()
    return {"ground tests": (least - minima.mean(), minima.std() / np.sqrt(outer))}


print("problem,quantity,quadrature,sampling,sampling_error")
for problem, exact, sampled in (
    ("wall", wall_by_quadrature(), wall_by_sampling()),
    ("years", years_by_quadrature(), years_by_sampling()),
):
    for name, value in exact.items():
        mean, error = sampled.get(name, ("", ""))
        shown = f"{mean:.4f},{error:.4f}" if name in sampled else ","
        print(f"{problem},{name},{value:.5f},{shown}")
