"""The wall of bench.yaml in numpy, in chunks. Usage: python3 yardstick.py SAMPLES < correlation.txt"""
import json, sys, time
import numpy as np

try:
    from scipy.special import ndtr, ndtri
except ImportError:  # a rational approximation of the same cost class
    from math import sqrt

    def ndtr(u):
        t = 1 / (1 + 0.3275911 * np.abs(u) / sqrt(2))
        tail = 0.5 * t * (0.254829592 + t * (-0.284496736 + t * (1.421413741 + t * (-1.453152027 + t * 1.061405429)))) * np.exp(-u * u / 2)
        return np.where(u < 0, tail, 1 - tail)

    def ndtri(p):
        q = np.sqrt(-2 * np.log(np.minimum(p, 1 - p)))
        x = q - (2.515517 + q * (0.802853 + q * 0.010328)) / (1 + q * (1.432788 + q * (0.189269 + q * 0.001308)))
        return np.where(p < 0.5, -x, x)


samples = int(sys.argv[1]) if len(sys.argv) > 1 else 1_000_000
R = np.loadtxt(sys.stdin)
L = np.linalg.cholesky(R)
rng = np.random.default_rng(7)
CHUNK, GW, DEG = 16384, 9.81, np.pi / 180
h, crest, foot, toe, heel, t = 5.0, 0.3, 0.5, 0.8, 2.4, 0.5
B, H = toe + foot + heel, h + t
fill_sat, sand_sat, boundary, front_level, front_water = 21, 20, 2.5, 1.0, 0.5
lean, d = (foot - crest) / h, front_level - t
toe_area, toe_x = toe * d + 0.5 * lean * d * d, 0.5 * toe * toe * d + 0.5 * toe * lean * d * d + lean * lean * d**3 / 6
pa, pb = ndtr((25 - 33) / 2.6), ndtr((42 - 33) / 2.6)


def lognormal(u, mean, sd):
    z2 = np.log(1 + (sd / mean) ** 2)
    return np.exp(np.log(mean) - z2 / 2 + np.sqrt(z2) * u)


failures, done = np.zeros(4, dtype=np.int64), 0
start = time.process_time()
while done < samples:
    u = L @ rng.standard_normal((10, CHUNK))
    g1, phi1 = 19 + 0.95 * u[0], DEG * lognormal(u[1], 35, 2.8)
    g2, phi2 = 18 + 0.9 * u[2], DEG * (33 + 2.6 * ndtri(pa + (pb - pa) * ndtr(u[3])))
    p = ndtr(u[4])
    level = np.where(p < 1.7 / 4, 0.5 + np.sqrt(p * 4 * 1.7), 4.5 - np.sqrt((1 - p) * 4 * 2.3))
    beta = 3 * np.sqrt(6) / np.pi
    q = np.maximum(10 - 0.5772156649015329 * beta - beta * np.log(-np.log(ndtr(u[5]))), 0)
    ratio, ft, fb, gc = 0.7 + 0.25 * ndtr(u[6]), lognormal(u[7], 1, 0.1), lognormal(u[8], 1, 0.15), 24 + 0.7 * u[9]
    k1, k2 = np.tan(np.pi / 4 - phi1 / 2) ** 2, np.tan(np.pi / 4 - phi2 / 2) ** 2
    w1, w2 = np.clip(level, boundary, H), np.clip(level, 0, boundary)
    s0 = q
    s1 = s0 + g1 * (H - w1)
    s2 = s1 + (fill_sat - GW) * (w1 - boundary)
    s3 = s2 + g2 * (boundary - w2)
    s4 = s3 + (sand_sat - GW) * w2
    P, M = 0.0, 0.0
    for k, a, b, top, bottom in ((k1, s0, s1, H, w1), (k1, s1, s2, w1, boundary), (k2, s2, s3, boundary, w2), (k2, s3, s4, w2, 0.0)):
        dd = top - bottom
        f = 0.5 * k * (a + b) * dd
        P = P + f
        M = M + f * bottom + dd * dd * k * (2 * a + b) / 6
    P, M = P * ft, M * ft
    push, front = 0.5 * GW * level**2, 0.5 * GW * front_water**2
    E, uplift = P + push - front, 0.5 * GW * (level + front_water) * B
    uplift_moment = GW * (2 * level + front_water) * B * B / 6
    triangle, stem, slab = 0.5 * (foot - crest) * h * gc, crest * h * gc, B * t * gc
    wh = np.clip(level, t, H)
    soil = heel * (g1 * (H - np.maximum(wh, boundary)) + fill_sat * (np.maximum(wh, boundary) - boundary)
                   + g2 * (boundary - np.minimum(wh, boundary)) + sand_sat * (np.minimum(wh, boundary) - t))
    W = triangle + stem + slab + soil + g2 * toe_area
    Mst = triangle * (toe + 2 / 3 * (foot - crest)) + stem * (toe + foot - crest / 2) + slab * B / 2 + soil * (B - heel / 2) + g2 * toe_x
    N, Mot = W - uplift, M + push * level / 3 - front * front_water / 3 + uplift_moment
    x = (Mst - Mot) / N
    width = 2 * np.minimum(x, B - x)
    slide, over = N * np.tan(ratio * phi2) / E < 1, Mst / Mot < 1
    nq = np.exp(np.pi * np.tan(phi2)) * np.tan(np.pi / 4 + phi2 / 2) ** 2
    ng, i = 2 * (nq + 1) * np.tan(phi2), np.maximum(1 - E / N, 0)
    q0 = g2 * (front_level - front_water) + (sand_sat - GW) * front_water
    bear = (width <= 0) | (fb * (q0 * nq * i**2 + 0.5 * (sand_sat - GW) * width * ng * i**3) * width / N < 1)
    failures += [slide.sum(), over.sum(), bear.sum(), (slide | over | bear).sum()]
    done += CHUNK
print(json.dumps({"samples": done, "failures": failures.tolist(), "seconds": time.process_time() - start}))
