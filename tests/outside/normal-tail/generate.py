"""Reference values of the standard normal with 50 digits (mpmath), printed to 17. Run: python3 generate.py > cases.csv"""
from mpmath import erfc, log, log1p, mp, mpf, npdf, sqrt

mp.dps = 50


def upper(z):
    return erfc(z / sqrt(mpf(2))) / 2


print("quantity,argument,value")
for step in range(-60, 61):
    z = mpf(step) * 5 / 8  # exact in binary: -37.5 to 37.5
    print(f"pdf,{float(z)!r},{mp.nstr(npdf(z), 17)}")
    print(f"upper,{float(z)!r},{mp.nstr(upper(z), 17)}")
    print(f"log_upper,{float(z)!r},{mp.nstr(log(upper(z)) if z > 0 else log1p(-upper(-z)), 17)}")
for z in (40, 100, 1000):
    print(f"log_upper,{float(z)!r},{mp.nstr(log(upper(mpf(z))), 17)}")
for exponent in [*range(-300, -20, 7), *range(-20, 0)]:
    q = float(f"1e{exponent}")
    guess = sqrt(-2 * log(mpf(q)))
    for _ in range(60):  # Newton on the logarithm converges from either side
        guess += upper(guess) / npdf(guess) * (log(upper(guess)) - log(mpf(q)))
    print(f"upper_quantile,{q!r},{mp.nstr(guess, 17)}")
