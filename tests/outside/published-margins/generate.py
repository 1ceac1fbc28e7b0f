"""Second method for the published margins: indices by constrained minimisation from many starts, probabilities by quadrature (scipy)."""
import numpy as np
from scipy import integrate, optimize, stats


def index(g, d, starts=40):
    rng = np.random.default_rng(1)
    best = None
    for _ in range(starts):
        r = optimize.minimize(lambda u: u @ u, rng.normal(size=d) * 2, constraints=[dict(type="eq", fun=g)],
                              method="SLSQP", options=dict(ftol=1e-14, maxiter=500))
        if r.success and abs(g(r.x)) < 1e-6 and (best is None or r.fun < best.fun):
            best = r
    return float(np.sqrt(best.fun)), best.x


# six lognormals
means, sds = np.array([120, 120, 120, 120, 50, 40.0]), np.array([12, 12, 12, 12, 15, 12.0])
zeta = np.sqrt(np.log1p((sds / means) ** 2))
lam = np.log(means) - zeta**2 / 2
c = np.array([1, 2, 2, 1, -5, -5.0])
print("frame", index(lambda u: (c @ np.exp(lam + zeta * u)) / 100, 6)[0])

# parabola with two points: P(b - u2 - k (u1 - e)^2 < 0), one integral over u1
b, k, e = 5, 0.5, 0.1
f = lambda u: stats.norm.pdf(u) * stats.norm.sf(b - k * (u - e) ** 2)
print("parabola", integrate.quad(f, -12, 12, epsabs=0, epsrel=1e-12, limit=500)[0])
g = lambda u: b - u[1] - k * (u[0] - e) ** 2
for s in ([-3, 1], [3, 1]):
    r = optimize.minimize(lambda u: u @ u, s, constraints=[dict(type="eq", fun=g)], method="SLSQP", options=dict(ftol=1e-16))
    print("  point", r.x, np.sqrt(r.fun))

# cantilever: 18.46154 - 74769.23 x1 / x2^3
h = lambda u: (18.46154 - 74769.23 * (1000 + 200 * u[0]) / (250 + 37.5 * u[1]) ** 3) / 10
print("cantilever", index(h, 2))
q = lambda v: stats.norm.pdf(v) * stats.norm.sf((18.46154 * (250 + 37.5 * v) ** 3 / 74769.23 - 1000) / 200)
print("  probability", integrate.quad(q, -6.6, 10, epsabs=0, epsrel=1e-12, limit=500)[0])

# frame, probability: P(S > R) with R = x1 + 2 x2 + 2 x3 + x4, S = 5 x5 + 5 x6, by convolution of densities on a grid
step, n = 0.02, 1 << 18
grid = step * np.arange(n)


def cells(factor, mean, sd):
    z = np.sqrt(np.log1p((sd / mean) ** 2))
    law = stats.lognorm(z, scale=factor * np.exp(np.log(mean) - z * z / 2))
    return np.diff(law.cdf(np.append(-step / 2, grid + step / 2)))


ft = lambda parts: np.fft.irfft(np.prod([np.fft.rfft(p) for p in parts], axis=0), n)
resisting = ft([cells(1, 120, 12), cells(2, 120, 12), cells(2, 120, 12), cells(1, 120, 12)])
driving = ft([cells(5, 50, 15), cells(5, 40, 12)])
below = np.cumsum(resisting) - resisting / 2
print("frame, probability", below @ driving)

# oscillator: 3 r - |2 F sin(w t / 2) / (m w^2)|, w^2 = (c1 + c2) / m; F and r given the rest in closed form, the rest by quadrature
x, w = np.polynomial.hermite_e.hermegauss(120)
w = w / w.sum()
c = (1.1 + np.hypot(0.1, 0.01) * x)[:, None, None]
m = (1 + 0.05 * x)[None, :, None]
t = (1 + 0.2 * x)[None, None, :]
k = np.where((c > 0) & (m > 0), 2 * np.abs(np.sin(np.sqrt(np.abs(c / m)) * t / 2)) / np.abs(c), 0)
weights = w[:, None, None] * w[None, :, None] * w[None, None, :]
for mean, sd in ((1, 0.2), (0.6, 0.1), (0.45, 0.075)):
    spread = np.hypot(k * sd, 3 * 0.05)
    fails = stats.norm.sf((1.5 - k * mean) / spread) + stats.norm.sf((1.5 + k * mean) / spread)
    print("oscillator", mean, np.sum(weights * fails))
