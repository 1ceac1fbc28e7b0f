"""Force and moment of the active pressure of cohesive, sloping ground, by numerical integration of the published
pressure at 40 digits.  Needs mpmath."""
import random

import mpmath as mp

mp.mp.dps = 40


def pressure(s, c, phi, beta):  # Mazindrani and Ganjali (1997), as printed, s for their gamma z; root 0 where the radicand is negative
    cb, cf, sf = mp.cos(beta), mp.cos(phi), mp.sin(phi)
    radicand = 4 * cb**2 * (cb**2 - cf**2) * s * s + 4 * c * c * cf**2 + 8 * c * s * cb**2 * sf * cf
    root = mp.sqrt(radicand) if radicand > 0 else mp.mpf(0)
    return cb * ((2 * cb**2 * s + 2 * c * cf * sf - root) / cf**2 - s)


def integrals(s0, s1, length, c, phi, beta):
    cuts = [mp.mpf(0), mp.mpf(1)]
    if s1 != s0:
        turns = [2 * c * mp.tan(mp.pi / 4 + phi / 2)]
        if beta > phi:
            turns.append(c * mp.cos(phi) / (mp.cos(beta) * mp.sin(beta - phi)))
        cuts += [x for x in ((s - s0) / (s1 - s0) for s in turns) if 0 < x < 1]
    cuts = sorted(cuts)
    fine = [u + (v - u) * mp.mpf(k) / 6 for u, v in zip(cuts, cuts[1:]) for k in range(6)] + [mp.mpf(1)]
    p = lambda x: max(pressure(s0 + (s1 - s0) * x, c, phi, beta), mp.mpf(0))
    return length * mp.quad(p, fine), length**2 * mp.quad(lambda x: p(x) * (1 - x), fine)


random.seed(11)
print("top_stress,bottom_stress,length,cohesion,phi_deg,beta_deg,top_pressure,force,moment")
done = 0
while done < 200:
    phi = random.choice([0, 20, 30, 60, random.randint(0, 600) / 10, random.randint(150, 450) / 10])
    beta = random.choice([0, 45, min(phi, 45), random.randint(0, 450) / 10, min(45, round(phi * random.uniform(0.8, 1.2), 2))])
    c = random.choice([0, 5, round(random.uniform(0, 40), 1), round(10 ** random.uniform(-4, 3), 4)])
    s0 = random.choice([0, round(random.uniform(0, 150), 1), round(10 ** random.uniform(-2, 4), 2)])
    s1 = random.choice([round(s0 + random.uniform(0, 150), 1), round(s0 + 0.001, 4), s0, round(s0 * 0.6, 2), round(random.uniform(0, 250), 1)])
    if c == 0 and beta > phi:
        continue  # no active state anywhere: what is taken there is a convention of the program, not of the paper
    length = round(random.uniform(0.2, 9), 2)
    args = [mp.mpf(str(v)) for v in (s0, s1, length, c)] + [mp.mpf(str(v)) * mp.pi / 180 for v in (phi, beta)]
    force, moment = integrals(*args)
    if force < 1e-6 * length * max(args[0], args[1], args[3]):
        if force > 0 or random.random() > 0.05:
            continue  # of the ones without pressure a few are enough
        force = moment = mp.mpf(0)
    p0 = pressure(args[0], *args[3:])
    print(s0, s1, length, c, phi, beta, mp.nstr(p0, 15), mp.nstr(force, 15), mp.nstr(moment, 15), sep=",")
    done += 1
