"""Incomplete gamma and beta functions and Student's t with 40 digits (mpmath), printed to 17. python3 generate.py > cases.csv"""
from mpmath import betainc, gammainc, inf, loggamma, mp, mpf

mp.dps = 40


def row(name, a, b, x, value):
    if value > mpf("1e-290"):
        print(f"{name},{a!r},{b!r},{x!r},{mp.nstr(value, 17)}")


print("function,a,b,x,value")
for a in (0.0625, 0.3, 1.0, 2.5, 9.0, 60.75, 400.0, 1600.0):
    row("log_gamma", a, 0.0, 0.0, loggamma(mpf(a))) if a > 2 else None
    for ratio in (2.0**-30, 0.0625, 0.5, 0.875, 1.0, 1.125, 2.0, 8.0):
        x = a * ratio
        row("gamma_lower", a, 0.0, x, gammainc(mpf(a), 0, mpf(x), regularized=True))
        row("gamma_upper", a, 0.0, x, gammainc(mpf(a), mpf(x), inf, regularized=True))
for a in (0.0625, 0.5, 1.75, 9.0, 80.0, 3000.0):
    for b in (0.0625, 0.5, 2.25, 24.0, 2000.0):
        for x in (2.0**-30, 0.015625, 0.25, 0.5, 0.75, 1 - 2.0**-20):  # exact in binary, and so is 1 - x
            try:
                row("beta_lower", a, b, x, betainc(mpf(a), mpf(b), 0, mpf(x), regularized=True))
            except ValueError:  # the series of a = 3000, b = 2000 does not converge near 1
                pass
for degrees in (3.0, 5.0, 10.0, 30.0):
    for t in (0.0625, 0.5, 2.0, 8.0, 64.0, 65536.0):
        v, s = mpf(degrees), mpf(t)
        row("student_upper", degrees, 0.0, t, betainc(v / 2, mpf("0.5"), 0, v / (v + s * s), regularized=True) / 2)
