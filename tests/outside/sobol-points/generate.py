"""Points of the Sobol' sequence in 100 dimensions by scipy 1.17.1 (scipy.stats.qmc.Sobol, unscrambled), for dimensions.csv."""
import numpy as np
from scipy.stats import qmc

points = qmc.Sobol(100, scramble=False, bits=32).random(256)
weighted = (points * np.arange(256)[:, None]).sum(axis=0)
print("dimension,weighted_sum,x255")
for j in range(100):
    print(f"{j + 1},{float(weighted[j])!r},{float(points[255, j])!r}")
