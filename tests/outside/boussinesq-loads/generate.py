"""Pressure, thrust and moment of line and strip loads against a rigid vertical plane, by numerical integration of
Boussinesq's point load (Poisson's ratio 0.5, doubled by the image load).  Needs mpmath."""
import random

import mpmath as mp

mp.mp.dps = 25


def point(P, x, y, s):  # horizontal stress at depth s, x behind the plane, y along it
    return 3 * P * x**2 * s / (2 * mp.pi * (x * x + y * y + s * s) ** mp.mpf(2.5))


def line(Q, a, s):
    scale = mp.sqrt(a * a + s * s)
    return 2 * 2 * mp.quad(lambda v: point(Q, a, v * scale, s) * scale, [0, 1, 4, 20, mp.inf])


def over_plane(p, H, near):
    cuts = sorted({mp.mpf(0), *[v for v in (near / 4, near, 3 * near) if v < H], H})
    return mp.quad(p, cuts), mp.quad(lambda s: p(s) * (H - s), cuts)


random.seed(7)
print("kind,load,from,to,height,depth,pressure,thrust,moment")
for i in range(30):
    kind = "line" if i % 2 else "strip"
    load = round(random.uniform(5, 80), 1)
    a1 = round(10 ** random.uniform(-1, 1.3), 3) if kind == "line" or random.random() > 0.3 else 0.0
    a2 = a1 if kind == "line" else round(a1 + random.uniform(0.2, 6), 3)
    H, s = round(random.uniform(1, 12), 2), round(random.uniform(0.05, 9), 2)
    a1m, a2m, Hm, sm = map(mp.mpf, (str(a1), str(a2), str(H), str(s)))
    p = mp.mpf(str(load))
    if kind == "line":
        closed = lambda t: 4 * p / mp.pi * a1m**2 * t / (a1m**2 + t**2) ** 2
        at = line(p, a1m, sm)
        mp.mp.dps, keep = 15, mp.mp.dps
        assert abs(closed(sm) - at) < 1e-12 * at
        mp.mp.dps = keep
        thrust, moment = over_plane(closed, Hm, a1m)  # the line's pressure just confirmed from point loads
    else:
        strip = lambda t: mp.quad(lambda a: 4 * p / mp.pi * a**2 * t / (a**2 + t**2) ** 2, sorted({a1m, *[v for v in (t / 2, t, 2 * t) if a1m < v < a2m], a2m}))
        at = strip(sm)
        thrust, moment = over_plane(strip, Hm, a2m)
    print(kind, load, a1, a2, H, s, mp.nstr(at, 14), mp.nstr(thrust, 14), mp.nstr(moment, 14), sep=",")
