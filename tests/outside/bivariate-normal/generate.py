"""Φ2 with 30 digits (mpmath quadrature), printed to 15: small chances and strong correlations. python3 generate.py > deep.csv"""
from mpmath import linspace, mp, mpf, ncdf, npdf, nstr, quad, sqrt

mp.dps = 30


def bivariate(h, k, rho):
    r, s = mpf(rho), sqrt(1 - mpf(rho) ** 2)
    integrand = lambda x: npdf(x) * ncdf((k - r * x) / s)
    points = linspace(mpf(h) - 14, mpf(h), 113)
    scale = max(integrand(x) for x in points)  # the quadrature stops at an absolute error
    return scale * quad(lambda x: integrand(x) / scale, points)


if __name__ == "__main__":
    print("h,k,rho,Phi2")
    for h, k in ((-1, -3), (-3, -3), (-3.5, -4), (-8, -2), (-12, -12), (1, -5), (2, 3)):
        for rho in (-0.9, -0.5, 0.25, 0.75, 0.96875):
            value = bivariate(h, k, rho)
            if value > mpf("1e-280"):
                print(f"{h},{k},{rho},{nstr(value, 15)}")
